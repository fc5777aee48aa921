import { createHash } from 'node:crypto'
import { existsSync, readFileSync, readdirSync, writeFileSync } from 'node:fs'
import { dirname, join, relative } from 'node:path'

const FOLDERS = ['app', 'components', 'db', 'lib', 'plots', 'public', 'fonts']
const ROOT_FILES = /^(next\.config|postcss\.config|tsconfig|package|package-lock|auth|proxy|instrumentation|mdx-components)[.\w-]*$/
const NOT_BUILT = /\.test\.[cm]?tsx?$|\.md$|\.tsbuildinfo$/

/** The files a build is made of, in a fixed order. */
export function builtFiles(projectRoot) {
  const inFolders = FOLDERS.filter((folder) => existsSync(join(projectRoot, folder))).flatMap((folder) =>
    readdirSync(join(projectRoot, folder), { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile())
      .map((entry) => join(entry.parentPath ?? entry.path, entry.name).slice(projectRoot.length + 1)),
  )
  const atRoot = readdirSync(projectRoot, { withFileTypes: true })
    .filter((entry) => entry.isFile() && ROOT_FILES.test(entry.name))
    .map((entry) => entry.name)
  return [...inFolders, ...atRoot].filter((file) => !NOT_BUILT.test(file)).sort()
}

/** A fingerprint of everything that goes into a build: the sources, and the settings that are compiled in. */
export function sourcesHash(projectRoot, env = process.env) {
  const hash = createHash('sha256').update(process.version)
  for (const file of builtFiles(projectRoot)) {
    const bytes = readFileSync(join(projectRoot, file))
    hash.update(`\0${file}\0${bytes.length}\0`).update(bytes)
  }
  for (const name of Object.keys(env).filter((key) => key.startsWith('NEXT_PUBLIC_')).sort()) {
    hash.update(`\0${name}\0${env[name]}`)
  }
  return hash.digest('hex')
}

/** What tells Next where a place's build goes. */
export function buildSettings(place) {
  return { NEXT_DIST_DIR: place.distDir, ...(place.tsconfig && { NEXT_TSCONFIG: relative(place.root, place.tsconfig) }) }
}

function writeTsconfig({ root, tsconfig, distDir }) {
  const up = (path) => join(relative(dirname(tsconfig), root), path)
  writeFileSync(
    tsconfig,
    JSON.stringify({
      extends: up('tsconfig.json'),
      include: ['next-env.d.ts', '**/*.ts', '**/*.tsx', `${distDir}/types/**/*.ts`].map(up),
      exclude: ['node_modules', '.local', '.next'].map(up),
    }),
  )
}

/** Builds the app unless the last build was of these very sources. */
export async function buildApp({ place, processes, env, say }) {
  const hash = sourcesHash(place.root, { ...processes.env, ...env })
  // Kept inside the build, so that whoever deletes the one deletes the other.
  const note = join(place.root, place.distDir, 'hoopwright-sources')
  if (existsSync(note) && readFileSync(note, 'utf8') === hash) return say('sources unchanged')
  if (place.tsconfig) writeTsconfig(place)
  await processes.run('build', process.execPath, [join('node_modules', 'next', 'dist', 'bin', 'next'), 'build'], {
    env: { ...env, ...buildSettings(place), NODE_ENV: 'production' },
    failure: 'The app could not be built.',
    todo: 'Mend what the lines above name and run this again.',
  })
  writeFileSync(note, hash)
  say('built')
}
