import type { Band, Channel, FoundQuantity, ProcedureDocument, Quantity, Step } from '../procedure-document';
import { channelsOf, findsOf, isFoundQuantity, placedReadsOf, resultsOf, takenOf } from '../step-parts';

/** A quantity with a band, the role of the gear that shows it, and where it stands. */
export interface BandedQuantity {
  readonly step: Step;
  readonly quantity: Quantity;
  readonly band: Band;
  readonly gear?: string;
  readonly pointer: string;
}

/** Every quantity of the steps that has a band. */
export function bandedQuantities(document: ProcedureDocument): readonly BandedQuantity[] {
  return document.steps.flatMap((step, place) =>
    quantitiesOf(step, `/steps/${place}`).flatMap(({ quantity, gear, pointer }): BandedQuantity[] => {
      const { band } = quantity;
      if (band === undefined) return [];
      return [{ step, quantity, band, pointer: `${pointer}/band`, ...(gear === undefined ? {} : { gear }) }];
    }),
  );
}

/** Every quantity of the steps that is read off gear, with the gear's role. */
export function shownQuantities(
  document: ProcedureDocument,
): readonly { readonly quantity: Quantity; readonly gear: string }[] {
  return document.steps.flatMap((step) =>
    quantitiesOf(step, '').flatMap(({ quantity, gear }) => (gear === undefined ? [] : [{ quantity, gear }])),
  );
}

interface PlacedQuantity {
  readonly quantity: Quantity;
  readonly gear?: string | undefined;
  readonly pointer: string;
}

function quantitiesOf(step: Step, pointer: string): readonly PlacedQuantity[] {
  return [
    ...placedReadsOf(step).map(({ part, pointer: place }): PlacedQuantity => {
      // What is known by a way is not read off the gear directly.
      const gear = part.ways === undefined ? part.gear : undefined;
      return { quantity: part, gear, pointer: `${pointer}/${place}` };
    }),
    ...findsOf(step).flatMap((found, index): PlacedQuantity[] =>
      isFoundQuantity(found)
        ? [{ quantity: found, gear: channelGear(found, channelsOf(step)), pointer: `${pointer}/finds/${index}` }]
        : [],
    ),
    ...takenOf(step).map((quantity, index): PlacedQuantity => ({ quantity, pointer: `${pointer}/takes/${index}` })),
    ...resultsOf(step).map((quantity, index): PlacedQuantity => ({ quantity, pointer: `${pointer}/results/${index}` })),
  ];
}

/** Only what is a reading of one channel has that channel's resolution. */
function channelGear(found: FoundQuantity, channels: readonly Channel[]): string | undefined {
  if (found.what !== 'seal-point' && found.what !== 'highest-gauge') return undefined;
  return channels.find(({ name }) => name === 'gauge')?.gear;
}
