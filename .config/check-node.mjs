// Stops early, with a way out, on a Node that cannot run this project (npm scripts find node_modules/.bin/node first).
const [major, minor] = process.versions.node.split('.').map(Number);
if (major < 22 || (major === 22 && minor < 19)) {
  process.stderr.write(
    `Node ${process.versions.node} is too old: 22.19 or newer is needed. On Linux x64 "npm ci" brings a fitting Node ` +
      'for the npm scripts; elsewhere install Node 24 and try again.\n',
  );
  process.exit(1);
}
