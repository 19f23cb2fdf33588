// The arrows of the house: who may import whom. The lint rule built from this list breaks the build on a wrong one.
const { readdirSync, existsSync } = require('node:fs');
const { join } = require('node:path');

const folders = (path) =>
  existsSync(path)
    ? readdirSync(path, { withFileTypes: true }).flatMap((entry) => (entry.isDirectory() ? [entry.name] : []))
    : [];

/** Inside the core each folder sees only the ones listed here. */
const coreSees = {
  calculations: [],
  document: ['calculations'],
  engine: ['document', 'calculations'],
  'bench-model': ['calculations'],
  library: ['document', 'calculations'],
};
/** Rooms of the app that every feature may use. */
const sharedRooms = ['core', 'shared'];
/** Rooms of the server that every feature may use; the rest talk through what app.ts wires together. */
const serverRooms = ['database', 'http'];

exports.zones = (root) => {
  const at = (...path) => join(root, ...path);
  const zone = (target, from, message) => ({ target: at(target), from: at(from), message });
  const zones = [
    zone('procedures', 'src', 'The core knows no shell.'),
    zone('procedures', 'server', 'The core knows no shell.'),
    zone('server', 'src', 'The server does not import the app.'),
  ];
  for (const room of folders(at('procedures'))) {
    for (const other of folders(at('procedures'))) {
      if (room === other || (coreSees[room] ?? []).includes(other)) continue;
      zones.push(
        zone(`procedures/${room}`, `procedures/${other}`, `procedures/${room} may not see procedures/${other}.`),
      );
    }
  }
  for (const feature of folders(at('src/app'))) {
    for (const other of folders(at('src/app'))) {
      if (feature === other || sharedRooms.includes(other)) continue;
      zones.push(
        zone(`src/app/${feature}`, `src/app/${other}`, `src/app/${feature} may not reach into src/app/${other}.`),
      );
    }
  }
  for (const feature of folders(at('server'))) {
    for (const other of folders(at('server'))) {
      if (feature === other || serverRooms.includes(other) || ['database', 'start'].includes(feature)) continue;
      zones.push({
        target: at('server', feature),
        from: at('server', other),
        except: ['./index.ts', `./${other}.service.ts`, `./${other}.entity.ts`],
        message: `server/${feature} may use server/${other} only through its service or entity.`,
      });
    }
  }
  return zones;
};
