import ts from 'typescript';

/** As much of JSON Schema as the product's schemas use. */
export interface Schema {
  readonly $ref?: string;
  readonly $defs?: Readonly<Record<string, Schema>>;
  readonly type?: string;
  readonly enum?: readonly unknown[];
  readonly const?: unknown;
  readonly pattern?: string;
  readonly maxLength?: number;
  readonly maxItems?: number;
  readonly maxProperties?: number;
  readonly items?: Schema;
  readonly properties?: Readonly<Record<string, Schema>>;
  readonly required?: readonly string[];
  readonly additionalProperties?: Schema | boolean;
  readonly oneOf?: readonly Schema[];
  readonly allOf?: readonly { readonly if?: Schema; readonly then?: Schema }[];
}

/** Walks a TypeScript type and a schema side by side and lists where they differ. */
export class SchemaAgreement {
  readonly differences: string[] = [];
  /** How many places were compared, so that a spec can tell that something was. */
  compared = 0;
  private readonly checker: ts.TypeChecker;
  private readonly source: ts.SourceFile;

  constructor(
    file: string,
    private readonly root: Schema,
  ) {
    const program = ts.createProgram([file], {
      strict: true,
      exactOptionalPropertyTypes: true,
      target: ts.ScriptTarget.ES2022,
      module: ts.ModuleKind.ES2022,
      moduleResolution: ts.ModuleResolutionKind.Bundler,
      types: [],
    });
    this.checker = program.getTypeChecker();
    const source = program.getSourceFile(file);
    if (source === undefined) throw new Error(`${file} is not there`);
    this.source = source;
  }

  /** An exported interface or type by its name. */
  typeNamed(name: string): ts.Type {
    const moduleSymbol = this.checker.getSymbolAtLocation(this.source);
    const symbol = moduleSymbol && this.checker.getExportsOfModule(moduleSymbol).find((found) => found.name === name);
    if (symbol === undefined) throw new Error(`${name} is not exported`);
    return this.checker.getDeclaredTypeOfSymbol(symbol);
  }

  /** The properties of a type, by name. */
  propertiesOf(type: ts.Type): ReadonlyMap<string, ts.Type> {
    return new Map(
      this.checker.getPropertiesOfType(type).map((property) => [property.name, this.checker.getTypeOfSymbol(property)]),
    );
  }

  compare(type: ts.Type, given: Schema, path: string): void {
    this.compared += 1;
    const schema = this.resolved(given);
    const literals = literalsOf(type);
    if (literals !== undefined) return this.literals(literals, schema, path);
    if (schema.oneOf !== undefined) return this.union(type, schema.oneOf, path);
    if (type.flags & ts.TypeFlags.String) return this.text(schema, path);
    if (type.flags & ts.TypeFlags.Number)
      return this.expect(['number', 'integer'].includes(schema.type ?? ''), path, 'a number');
    const isBoolean = type.isUnion() && type.types.every(({ flags }) => flags & ts.TypeFlags.BooleanLiteral);
    if (isBoolean) return this.expect(schema.type === 'boolean', path, 'a boolean');
    const item = this.itemOf(type);
    if (item !== undefined) return this.list(item, schema, path);
    const values = type.getStringIndexType();
    if (values !== undefined) return this.record(values, schema, path);
    this.object(type, schema, path);
  }

  private object(type: ts.Type, schema: Schema, path: string): void {
    this.expect(
      schema.type === 'object' && schema.additionalProperties === false,
      path,
      'an object that refuses unknown fields',
    );
    const properties = this.checker.getPropertiesOfType(type);
    const inSchema = Object.keys(schema.properties ?? {}).sort();
    const inType = properties.map(({ name }) => name).sort();
    this.expect(inSchema.join() === inType.join(), path, `the fields ${inType.join(', ')}, not ${inSchema.join(', ')}`);
    for (const property of properties) {
      const isOptional = (property.flags & ts.SymbolFlags.Optional) !== 0;
      const isRequired = schema.required?.includes(property.name) ?? false;
      this.expect(isRequired !== isOptional, `${path}.${property.name}`, isOptional ? 'not required' : 'required');
      const child = schema.properties?.[property.name];
      if (child === undefined) continue;
      const childType = this.checker.getNonNullableType(this.checker.getTypeOfSymbol(property));
      this.compare(childType, child, `${path}.${property.name}`);
    }
  }

  /** Each alternative of the schema against the members of the union that carry its tag. */
  private union(type: ts.Type, alternatives: readonly Schema[], path: string): void {
    const members = type.isUnion() ? type.types : [type];
    const matched = new Set<ts.Type>();
    for (const alternative of alternatives) {
      const schema = this.resolved(alternative);
      const member = members.find((candidate) => this.tagsOf(candidate, schema) !== undefined);
      if (member === undefined) this.differences.push(`${path}: an alternative that the type does not have`);
      else this.compare(member, schema, `${path}<${this.tagsOf(member, schema) ?? ''}>`);
      if (member !== undefined) matched.add(member);
    }
    this.expect(matched.size === members.length, path, `${members.length} alternatives, not ${matched.size}`);
  }

  private tagsOf(member: ts.Type, schema: Schema): string | undefined {
    for (const [name, tag] of Object.entries(schema.properties ?? {})) {
      const values = tag.const === undefined ? tag.enum : [tag.const];
      const property = this.propertiesOf(member).get(name);
      const literals = property && literalsOf(property);
      if (!['kind', 'what'].includes(name) || values === undefined || literals === undefined) continue;
      return [...values].sort().join() === [...literals].sort().join() ? values.join('|') : undefined;
    }
    return undefined;
  }

  private list(item: ts.Type, schema: Schema, path: string): void {
    this.expect(schema.type === 'array' && schema.maxItems !== undefined, path, 'a list with a bound');
    if (schema.items !== undefined) this.compare(item, schema.items, `${path}[]`);
  }

  private record(values: ts.Type, schema: Schema, path: string): void {
    const child = schema.additionalProperties;
    this.expect(schema.type === 'object' && schema.maxProperties !== undefined, path, 'a table with a bound');
    if (typeof child === 'object') this.compare(values, child, `${path}{}`);
    else this.differences.push(`${path}: values of a table without a schema`);
  }

  private text(schema: Schema, path: string): void {
    const isFixed = /^\^[^*+]*\$$/.test(schema.pattern ?? '*');
    this.expect(schema.type === 'string' && (schema.maxLength !== undefined || isFixed), path, 'text with a bound');
  }

  private literals(literals: readonly unknown[], schema: Schema, path: string): void {
    const values = schema.const === undefined ? (schema.enum ?? []) : [schema.const];
    const same = [...values].sort().join() === [...literals].sort().join();
    this.expect(same, path, `one of ${literals.join(', ')}, not ${values.join(', ')}`);
  }

  private itemOf(type: ts.Type): ts.Type | undefined {
    const name = type.getSymbol()?.name;
    if (name !== 'Array' && name !== 'ReadonlyArray') return undefined;
    return this.checker.getTypeArguments(type as ts.TypeReference)[0];
  }

  private resolved(schema: Schema): Schema {
    const name = schema.$ref?.replace('#/$defs/', '');
    if (name === undefined) return schema;
    const found = this.root.$defs?.[name];
    if (found === undefined) throw new Error(`${name} is not defined`);
    return this.resolved(found);
  }

  private expect(holds: boolean, path: string, wanted: string): void {
    if (!holds) this.differences.push(`${path}: should be ${wanted}`);
  }
}

/** The values of a type that is nothing but string or number literals. */
function literalsOf(type: ts.Type): readonly (string | number)[] | undefined {
  const members = type.isUnion() ? type.types : [type];
  const values = members.flatMap((member) =>
    member.isStringLiteral() || member.isNumberLiteral() ? [member.value] : [],
  );
  return values.length === members.length ? values : undefined;
}
