import type { UnitName } from '../../../../procedures/calculations/for-a-run';
import type { TroubleCodeEntry, VisitSnapshot } from '../../../../procedures/engine/showing';

/** A car with a fault that nobody is told about, for a run of kind practice. */
export interface PracticeScenario {
  readonly id: string;
  readonly title: string;
  /** What the driver says. */
  readonly story: string;
  readonly procedureId: string;
  readonly half: 'cold' | 'warm';
  /** Stands in the headers of its runs, so that a run is found back to its scenario. */
  readonly visitId: string;
  /** The invented car. */
  readonly visit: VisitSnapshot;
  readonly displacementL: string;
  /** The place of the practice: name and elevation, as a site has them. */
  readonly place: { readonly name: string; readonly elevationM: string };
  readonly ramp: SampleRamp;
  /** What the instruments show and what is seen and heard, by step id. */
  readonly bench: Readonly<Record<string, readonly BenchEntry[]>>;
  readonly planted: PlantedFault;
}

/** A ramp that ships with the app: what the listen step takes as its log. */
export interface SampleRamp {
  /** Under the app's own address, `practice/cold-morning.csv`. */
  readonly path: string;
  /** As a file would be called. */
  readonly fileName: string;
}

export type BenchEntry =
  | {
      readonly what: 'figure';
      /** The quantity's, entry's or channel's name in the procedure. */
      readonly name: string;
      readonly label: string;
      readonly text: string;
      readonly unit: UnitName;
    }
  | { readonly what: 'codes'; readonly codes: readonly TroubleCodeEntry[] }
  | { readonly what: 'seen'; readonly text: string };

/** What is wrong with the car, told after the run alone. */
export interface PlantedFault {
  /** The finding's id that a careful run comes to. */
  readonly finding: string;
  /** In words. */
  readonly fault: string;
  /** Where the noise stops and at which pressure above the air of the place; absent where it never does. */
  readonly noiseStops?: { readonly timeS: number; readonly gaugeKpa: number };
  /** What to take from it. */
  readonly lesson: string;
}
