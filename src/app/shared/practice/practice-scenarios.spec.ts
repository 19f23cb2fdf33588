import { checkVin } from '../../../../procedures/calculations';
import { compiledLibraryProcedure, sampleRamp, walkScenario } from '../testing/walk-scenario';
import { practiceScenarios, scenarioOfVisit } from './practice-scenarios';

/** What a careful apprentice chooses where the bench lets something be seen. */
const carefulChoices: Readonly<Record<string, Readonly<Record<string, readonly string[]>>>> = {
  'hot-idle-whistle': { 'still-quiet': ['stillQuiet'] },
  'cold-morning': { 'where-it-comes-out': ['airAtValve'], look: ['carboned'] },
  'after-the-repair': { look: ['clean'] },
  'whole-kilopascals': { 'still-quiet': ['stillQuiet'] },
};
const always = { 'clear-codes': ['codesCleared'], 'other-half': ['otherHalfToCome'] };

describe('practice scenarios', () => {
  const procedure = compiledLibraryProcedure();

  it.each(practiceScenarios.map((scenario) => [scenario.title, scenario] as const))(
    '%s leads to its planted finding when the bench is read with care',
    (_title, scenario) => {
      const choices = { ...always, ...carefulChoices[scenario.id] };
      const { state } = walkScenario(procedure, scenario, { choices });
      expect(state.status).toBe('closed');
      expect(state.finding).toBe(scenario.planted.finding);
    },
  );

  it.each(practiceScenarios.map((scenario) => [scenario.title, scenario] as const))(
    '%s has a ramp in which the noise stops where it is said to',
    (_title, { planted, ...scenario }) => {
      const series = sampleRamp({ planted, ...scenario });
      const sound = series.channels.find(({ name }) => name === 'sound')?.values ?? [];
      const meanOver = (fromS: number, toS: number): number => {
        const levels = sound.filter((_, i) => (series.timeS[i] ?? 0) >= fromS && (series.timeS[i] ?? 0) < toS);
        return levels.reduce<number>((sum, level) => sum + (level ?? 0), 0) / levels.length;
      };
      const { noiseStops } = planted;
      const lastS = series.timeS.at(-1) ?? 0;
      const end = noiseStops?.timeS ?? lastS;
      const isQuietAfter = noiseStops !== undefined && meanOver(end + 1, lastS) < meanOver(end - 11, end - 1) - 5;
      expect(isQuietAfter).toBe(noiseStops !== undefined);
    },
  );

  it('are found back by the visit in their runs’ headers', () => {
    expect(practiceScenarios.map(({ visitId }) => scenarioOfVisit(visitId)?.id)).toEqual(
      practiceScenarios.map(({ id }) => id),
    );
    expect(scenarioOfVisit('0193b0a0-0009-7000-8000-00000000c009')).toBeUndefined();
  });

  it('have cars whose VIN passes its check digit', () => {
    expect(practiceScenarios.map(({ visit }) => checkVin(visit.vin).valid)).toEqual(practiceScenarios.map(() => true));
  });

  it.each(practiceScenarios.map((scenario) => [scenario.title, scenario] as const))(
    '%s shows something at every step that asks for something to be seen',
    (_title, { half, bench }) => {
      const asks = new Set(['reading', 'wait', 'choice', 'codes', 'drive']);
      const ofTheOtherHalf = half === 'cold' ? ['warm-up', 'still-warm', 'rewarm-zero'] : ['cold-enough'];
      const silent = procedure.document.steps.filter(
        ({ id, kind }) => asks.has(kind) && !ofTheOtherHalf.includes(id) && bench[id] === undefined,
      );
      expect(silent.map(({ id }) => id)).toEqual([]);
    },
  );

  it('show something only at steps that the procedure has', () => {
    const strange = practiceScenarios.flatMap(({ bench }) => Object.keys(bench).filter((id) => !procedure.step(id)));
    expect(strange).toEqual([]);
  });
});
