import type { Band, Channel, Found, ProcedureDocument, Quantity, Step } from '../procedure-document';

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

interface Placed {
  readonly quantity: Quantity;
  readonly gear?: string | undefined;
  readonly pointer: string;
}

function quantitiesOf(step: Step, pointer: string): readonly Placed[] {
  const results =
    step.kind === 'finding'
      ? []
      : (step.results ?? []).map((quantity, index): Placed => ({ quantity, pointer: `${pointer}/results/${index}` }));
  switch (step.kind) {
    case 'reading':
    case 'wait':
      return [
        ...step.reads.map((quantity, index): Placed => {
          // What is known by a way is not read off the gear directly.
          const gear = quantity.ways === undefined ? quantity.gear : undefined;
          return { quantity, gear, pointer: `${pointer}/reads/${index}` };
        }),
        ...results,
      ];
    case 'listen':
      return [
        ...step.finds.flatMap((found, index): Placed[] =>
          'unit' in found
            ? [{ quantity: found, gear: channelGear(found, step.channels), pointer: `${pointer}/finds/${index}` }]
            : [],
        ),
        ...results,
      ];
    default:
      return results;
  }
}

/** Only what is a reading of one channel has that channel's resolution. */
function channelGear(found: Found, channels: readonly Channel[]): string | undefined {
  if (found.what !== 'seal-point' && found.what !== 'highest-gauge') return undefined;
  return channels.find(({ name }) => name === 'gauge')?.gear;
}
