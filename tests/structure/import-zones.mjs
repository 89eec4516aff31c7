// The import table of the project as one pure function over paths. It works on the shape of a path, not on
// a list of features, so a new feature, lookup or server folder is covered from its first file.

/** Physics folders in the order in which they may build on each other: each may import what stands before it. */
export const physicsOrder = [
  'gap',
  'spark',
  'line',
  'capacitor',
  'charging',
  'circuit',
  'channel',
  'alignment',
  'gas',
  'room',
  'beam',
  'dye',
  'wear',
  'calibration',
  'oscillogram',
];

/** Folders of the domain that hold no physics, again in building order. */
const groundOrder = ['units', 'numerics'];
const bookOrder = ['book', 'rules', 'handover', 'lookup', 'report'];

const nodeOnlyPackages = [
  'express',
  'helmet',
  'knex',
  'mysql2',
  'pino',
  'pino-http',
  '@node-rs/argon2',
  'nodemailer',
];
const browserOnlyPackages = [
  'react',
  'react-dom',
  'react-router-dom',
  'dexie',
  '@tanstack/react-query',
  'workbox-window',
];
const dataPackages = [
  'dexie',
  '@tanstack/react-query',
  '@tanstack/react-query-persist-client',
  'workbox-window',
];
const domainPackages = ['zod', '@noble/hashes'];

/**
 * Why a file may not import something, or undefined when it may.
 * @param {string} fromFile path of the importing file, relative to the project, with forward slashes
 * @param {string} specifier what stands in the import, as written
 * @returns {string | undefined} the objection in words
 */
export function judgeImport(fromFile, specifier) {
  const from = placeOf(fromFile);
  if (from.zone === 'tests' || from.zone === 'outside') return undefined;
  if (!specifier.startsWith('.')) return judgePackage(from, fromFile, specifier);
  const targetFile = resolveRelative(fromFile, specifier);
  const to = placeOf(targetFile);
  if (to.zone === 'tests') return 'tests are imported by nothing';
  return judgePlace(from, to, targetFile);
}

/** @param {string} file */
function placeOf(file) {
  const parts = file.split('/');
  const name = parts.at(-1) ?? '';
  if (parts[0] === 'tests' || /\.(test|e2e)(\.[cm]?[jt]sx?)?$/.test(name))
    return { zone: 'tests', folder: '' };
  if (parts[0] === 'migrations' || parts[0] === 'seeds') return { zone: parts[0], folder: '' };
  if (parts[0] === 'server') {
    return { zone: 'server', folder: parts.length > 2 ? (parts[1] ?? '') : serverRootRole(name) };
  }
  if (parts[0] !== 'src') return { zone: 'outside', folder: '' };
  if (parts.length === 2) return { zone: 'app', folder: '' };
  return { zone: parts[1] ?? '', folder: parts.length > 3 ? (parts[2] ?? '') : '' };
}

/** @param {string} name */
function serverRootRole(name) {
  return /^(config|logger)(\.|$)/.test(name) ? ':base' : ':root';
}

/**
 * @param {{zone: string, folder: string}} from
 * @param {{zone: string, folder: string}} to
 * @param {string} targetFile
 */
function judgePlace(from, to, targetFile) {
  switch (from.zone) {
    case 'domain':
      return to.zone === 'domain'
        ? judgeDomain(from.folder, to.folder)
        : 'the domain imports nothing outside itself';
    case 'config':
      return allow(to.zone === 'config', 'src/config imports nothing of the project');
    case 'components':
      return allow(
        to.zone === 'components' || (to.zone === 'domain' && to.folder === 'units'),
        'components know only components and domain/units',
      );
    case 'data':
      return allow(['data', 'domain', 'config'].includes(to.zone), 'data imports only domain and config');
    case 'features':
      if (to.zone === 'features') {
        return allow(to.folder === from.folder, 'a feature never imports another feature; app composes them');
      }
      return allow(
        ['domain', 'data', 'components', 'config'].includes(to.zone),
        'a feature imports only domain, data, components and config',
      );
    case 'app':
      return allow(isClient(to.zone), 'the client never imports the server side');
    case 'server':
      return judgeServer(from.folder, to, targetFile);
    case 'migrations':
      return allow(to.zone === 'migrations', 'a migration imports nothing of the project');
    case 'seeds':
      return allow(
        ['seeds', 'domain', 'server'].includes(to.zone),
        'seeds import only the domain and the server',
      );
    default:
      return `src/${from.zone} has no row in the import table: give it one in tests/structure/import-zones.mjs`;
  }
}

/** @param {string} from @param {string} to */
function judgeDomain(from, to) {
  if (from === to) return undefined;
  if (from === '') return 'files directly in src/domain belong in a folder of it';
  const kinds = { ground: 0, physics: 1, book: 2 };
  const fromKind = domainKind(from);
  const toKind = domainKind(to);
  if (kinds[toKind] > kinds[fromKind]) return `domain/${from} may not import domain/${to}: leftward only`;
  if (toKind === 'ground') {
    return allow(
      fromKind !== 'ground' || stands(groundOrder, to, from),
      'leftward only: units, then numerics',
    );
  }
  if (fromKind === 'physics') {
    return allow(
      stands(physicsOrder, to, from),
      `domain/${from} may build only on physics folders that stand before it`,
    );
  }
  if (toKind === 'physics') {
    return allow(['rules', 'lookup'].includes(from), 'of the Book only a rule or a lookup may ask physics');
  }
  return allow(stands(bookOrder, to, from), 'leftward only: book, rules, handover, report');
}

/** @param {string} folder @returns {'ground' | 'physics' | 'book'} */
function domainKind(folder) {
  if (groundOrder.includes(folder)) return 'ground';
  return bookOrder.includes(folder) ? 'book' : 'physics';
}

/** A folder that the order does not name yet stands behind all that it names. @param {string[]} order @param {string} first @param {string} second */
function stands(order, first, second) {
  const rank = order.indexOf(first);
  const other = order.indexOf(second);
  return rank >= 0 && (other < 0 || rank < other);
}

const serverPorts = ['mail', 'attachments'];

/** Plain scripts that run before there are packages: what each may import of the server besides itself. */
const scriptFolders = new Map([
  ['launch', []],
  ['stand-ins', ['launch']],
]);

/**
 * @param {string} from
 * @param {{zone: string, folder: string}} to
 * @param {string} targetFile
 */
function judgeServer(from, to, targetFile) {
  if (to.zone === 'domain') return undefined;
  const assembles = from === ':root' || from === 'maintenance';
  if (to.zone === 'migrations' || to.zone === 'seeds') {
    return allow(assembles, 'only maintenance reaches for migrations and seeds');
  }
  if (to.zone !== 'server') return 'of src the server imports only the domain';
  if (assembles || from === to.folder) return undefined;
  const reach = scriptFolders.get(from);
  if (reach !== undefined)
    return allow(reach.includes(to.folder), 'start scripts know nothing of the server');
  if (scriptFolders.has(to.folder)) return 'the server knows nothing of the scripts that start it';
  if (to.folder === ':base') return undefined;
  if (from === ':base') return 'server config and logger import nothing of the server';
  if (to.folder === ':root' || to.folder === 'maintenance')
    return 'only the composition root assembles the server';
  if (to.folder === 'http' || to.folder === 'db') return undefined;
  if (from === 'http' || from === 'db') return 'http and db know no server feature';
  return allow(
    serverPorts.includes(to.folder) && !/-store(\.|$)/.test(targetFile),
    "a server feature reaches another one only through what the composition root hands it (mail's and attachments' ports apart)",
  );
}

/**
 * @param {{zone: string, folder: string}} from
 * @param {string} fromFile
 * @param {string} specifier
 */
function judgePackage(from, fromFile, specifier) {
  const isNode = specifier.startsWith('node:');
  const name = packageName(specifier);
  if (from.zone === 'domain') {
    return allow(domainPackages.includes(name), `the domain uses only ${domainPackages.join(' and ')}`);
  }
  if (from.zone === 'migrations') return allow(name === 'knex', 'a migration imports only knex types');
  if (from.zone === 'server' || from.zone === 'seeds') {
    return allow(!browserOnlyPackages.includes(name), `${name} belongs to the browser`);
  }
  if (isNode || nodeOnlyPackages.includes(name)) return `${name} does not exist in the browser`;
  if (from.zone === 'components') {
    return allow(!dataPackages.includes(name), 'a component knows no data source');
  }
  if (from.zone === 'data' && ['react', 'react-dom', 'react-router-dom'].includes(name)) {
    return allow(
      name === 'react' && /\/(use-[^/]*|client-context)\.tsx?$/.test(fromFile),
      'data knows React only in its live-query hooks (use-*.ts) and their provider',
    );
  }
  return undefined;
}

/** @param {string} specifier */
function packageName(specifier) {
  const parts = specifier.split('/');
  return specifier.startsWith('@') ? parts.slice(0, 2).join('/') : (parts[0] ?? '');
}

/** @param {string} fromFile @param {string} specifier */
function resolveRelative(fromFile, specifier) {
  const parts = fromFile.split('/').slice(0, -1);
  for (const step of specifier.split('?')[0]?.split('/') ?? []) {
    if (step === '..') parts.pop();
    else if (step !== '.') parts.push(step);
  }
  return parts.join('/');
}

/** @param {string} zone */
function isClient(zone) {
  return !['server', 'migrations', 'seeds', 'outside'].includes(zone);
}

/** @param {boolean} permitted @param {string} objection */
function allow(permitted, objection) {
  return permitted ? undefined : objection;
}
