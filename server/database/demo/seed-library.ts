import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { DataSource } from 'typeorm';
import { Person } from '../../access/access.entity';
import type { ProcedureDocument } from '../../../procedures/document';
import { checkedDocument } from '../../procedures/checked-document';
import { canonicalJson, sha256Hex } from '../../../procedures/engine';
import { ProcedureVersion } from '../../procedures/procedures.entity';
import { noteChange } from '../change-log';
import { demoLeadId } from './demo-garage';

/** Beside the core both in the sources and in the build. */
const libraryFolder = join(__dirname, '..', '..', '..', 'procedures', 'library');

/** Publishes as version 1 each authored procedure that the garage does not have yet. Gives their ids. */
export async function seedLibrary(database: DataSource, now: Date, folder = libraryFolder): Promise<readonly string[]> {
  if (!(await database.getRepository(Person).existsBy({ id: demoLeadId }))) return [];
  const published: string[] = [];
  for (const document of authoredDocuments(folder)) {
    const isNew = await database.transaction(async (manager) => {
      if (await manager.existsBy(ProcedureVersion, { procedureId: document.id })) return false;
      const text = canonicalJson(document);
      await manager.insert(ProcedureVersion, {
        procedureId: document.id,
        version: 1,
        title: document.title,
        document: text,
        contentHash: sha256Hex(text),
        publishedBy: demoLeadId,
        publishedAt: now,
      });
      await noteChange(manager, 'procedure', `${document.id}/1`);
      return true;
    });
    if (isNew) published.push(document.id);
  }
  return published;
}

function authoredDocuments(folder: string): readonly ProcedureDocument[] {
  if (!existsSync(folder)) return [];
  return readdirSync(folder)
    .filter((name) => name.endsWith('.json'))
    .sort()
    .map((name) => checkedDocument(JSON.parse(readFileSync(join(folder, name), 'utf8'))));
}
