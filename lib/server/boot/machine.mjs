import { spawnSync } from 'node:child_process'

/** What this machine must have; each missing thing is one plain sentence. */
export function requireNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number)
  if (major < 20 || (major === 20 && minor < 9)) {
    throw new Error(
      `Halfbaud needs Node 20.9 or later; this is Node ${process.versions.node}. Install a newer Node and try again.`,
    )
  }
}

const TOOLS = [
  { names: ['npm'], what: 'npm (it comes with Node)' },
  {
    names: ['c++', 'g++', 'clang++'],
    what: 'a C++ compiler (Debian: apt-get install g++; macOS: xcode-select --install)',
  },
  { names: ['make'], what: 'make (Debian: apt-get install make)' },
  { names: ['python3'], what: 'python3 (Debian: apt-get install python3)' },
]

/** SQLite's two drivers are compiled during the first install. */
export function requireToolchain() {
  const missing = TOOLS.filter((tool) => !tool.names.some(present)).map((tool) => tool.what)
  if (missing.length > 0) throw new Error(`The first install compiles SQLite and needs ${missing.join(', and ')}.`)
}

function present(name) {
  return spawnSync(name, ['--version'], { stdio: 'ignore' }).error === undefined
}
