/**
 * Makes a machine that has only Node.js ready: `node server/setup/bootstrap.mjs start|dev|build|backup|test`.
 * Written plainly at the top, so that an old Node.js gets as far as the sentence about its age.
 */
const MINIMUM = [20, 19];
const [major, minor] = process.versions.node.split('.').map(Number);

if (major < MINIMUM[0] || (major === MINIMUM[0] && minor < MINIMUM[1])) {
  console.error(
    'Siltline needs Node.js ' + MINIMUM.join('.') + ' or newer; this is ' + process.versions.node + '.',
  );
  process.exit(1);
}

const { prepare } = await import('./prepare.mjs');
process.exitCode = await prepare(process.argv[2]);
