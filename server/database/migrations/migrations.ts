import { CreatePeople1764547200000 } from './1764547200000-create-people';
import { CreateGearAndVisits1764547201000 } from './1764547201000-create-gear-and-visits';
import { CreateProcedures1764547202000 } from './1764547202000-create-procedures';
import { CreateRuns1764547203000 } from './1764547203000-create-runs';
import { CreateWitnessOfRuns1764547204000 } from './1764547204000-create-witness-of-runs';
import { CreateChangeLog1764547205000 } from './1764547205000-create-change-log';
import { RefuseChanges1764547206000 } from './1764547206000-refuse-changes';
import { IndexRunsByVisit1764547208000 } from './1764547208000-index-runs-by-visit';

/** Every migration in order. */
export const migrations = [
  CreatePeople1764547200000,
  CreateGearAndVisits1764547201000,
  CreateProcedures1764547202000,
  CreateRuns1764547203000,
  CreateWitnessOfRuns1764547204000,
  CreateChangeLog1764547205000,
  RefuseChanges1764547206000,
  IndexRunsByVisit1764547208000,
];
