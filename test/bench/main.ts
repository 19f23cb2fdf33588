/*
 * npm run bench: how the core grows, and how it stands beside general-purpose libraries doing the same, as JSON. Exits
 * with 1 when a budget is missed. `npm run bench -- replay` runs one of them.
 */
import { rounded, type Report } from './budget';
import { benchExpression } from './expression';
import { benchLint } from './lint';
import { benchRamp } from './ramp';
import { benchReplay } from './replay';

const benches: Readonly<Record<string, () => Report>> = {
  replay: benchReplay,
  lint: benchLint,
  expression: benchExpression,
  ramp: benchRamp,
};

const asked = process.argv.slice(2);
const unknown = asked.filter((name) => benches[name] === undefined);
if (unknown.length > 0) {
  process.stderr.write(`There is no bench called ${unknown.join(', ')}: ${Object.keys(benches).join(', ')}.\n`);
  process.exitCode = 2;
} else {
  const names = asked.length > 0 ? asked : Object.keys(benches);
  const reports = names.map((name) => [name, benches[name]!()] as const);
  const budgets = reports.flatMap(([, report]) => report.budgets);
  const timings = Object.fromEntries(
    reports.map(([name, report]) => [
      name,
      report.timings.map(({ perUnitNs, fastestNs, slowestNs, ...timing }) => ({
        ...timing,
        perUnitNs: rounded(perUnitNs),
        fastestNs: rounded(fastestNs),
        slowestNs: rounded(slowestNs),
      })),
    ]),
  );
  const about = { node: process.version, clock: 'processor time of this process, median of interleaved rounds' };
  process.stdout.write(`${JSON.stringify({ about, budgets, timings }, undefined, 2)}\n`);
  process.exitCode = budgets.every(({ met }) => met) ? 0 : 1;
}
