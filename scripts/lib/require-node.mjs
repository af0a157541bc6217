// Read by whatever Node is installed, however old: no syntax and no module here that Node 12 would not know.
export function requireNode() {
  const [major, minor] = process.versions.node.split(".").map(Number);
  if (major > 20 || (major === 20 && minor >= 19)) return;
  const found = process.versions.node;
  console.error(`Greenarc needs Node 20 (20.19 or later); this is Node ${found}. Install it, for example with: nvm install 20`);
  process.exit(1);
}
