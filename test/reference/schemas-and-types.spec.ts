import { join } from 'node:path';
import documentSchema from '../../procedures/document/procedure-document.schema.json';
import eventSchema from '../../procedures/engine/run-event.schema.json';
import { SchemaAgreement, type Schema } from '../support/schema-agreement';

// The TypeScript compiler reads the types; the schemas are hand-written. Neither is made from the other.
const procedures = join(__dirname, '../../procedures');

describe('the procedure document', () => {
  const agreement = new SchemaAgreement(
    join(procedures, 'document/procedure-document.ts'),
    documentSchema as unknown as Schema,
  );

  it('has the same fields, alternatives and words in its schema as in its type', () => {
    agreement.compare(agreement.typeNamed('ProcedureDocument'), documentSchema as unknown as Schema, 'document');
    expect(agreement.differences).toEqual([]);
    expect(agreement.compared).toBeGreaterThan(500);
  });

  it('would show a difference: the schema of an exit is not that of a branch', () => {
    const other = new SchemaAgreement(
      join(procedures, 'document/procedure-document.ts'),
      documentSchema as unknown as Schema,
    );
    other.compare(other.typeNamed('Branch'), { $ref: '#/$defs/exit' }, 'branch');
    expect(other.differences.join('\n')).toMatch(/the fields atMost, because, thenceforth, to, verdict, when/);
  });
});

describe('the run event', () => {
  const schema = eventSchema as unknown as Schema;
  const agreement = new SchemaAgreement(join(procedures, 'engine/run-event.ts'), schema);

  it('has the same envelope', () => {
    const properties = { ...schema.properties };
    delete properties['type'];
    delete properties['data'];
    const required = schema.required?.filter((name) => name !== 'type' && name !== 'data') ?? [];
    const envelope = { type: 'object', properties, required, additionalProperties: false };
    agreement.compare(agreement.typeNamed('EventEnvelope'), envelope, 'event');
    expect(agreement.differences).toEqual([]);
  });

  it('has the same data for every type', () => {
    const types = agreement.propertiesOf(agreement.typeNamed('RunEventData'));
    const dataOf = new Map(
      (schema.allOf ?? []).map((rule) => [rule.if?.properties?.['type']?.const, rule.then?.properties?.['data']]),
    );
    expect([...dataOf.keys()].sort()).toEqual([...types.keys()].sort());
    expect(schema.properties?.['type']?.enum?.toSorted()).toEqual([...types.keys()].sort());
    for (const [name, type] of types) agreement.compare(type, dataOf.get(name) ?? {}, name);
    expect(agreement.differences).toEqual([]);
    expect(agreement.compared).toBeGreaterThan(150);
  });
});
