import { readFile } from 'node:fs/promises'
import { createRequire, isBuiltin } from 'node:module'
import { basename, dirname, resolve } from 'node:path'
import { addTypeTemplate, defineNuxtModule } from '@nuxt/kit'
import { build } from 'esbuild'
import type { Plugin as EsbuildPlugin } from 'esbuild'
import type { Plugin as RollupPlugin } from 'rollup'

const MARK = '\0emitted:'
const ASSET = 'asset-file'
const QUERY = /\?(worker-file|asset-file)$/

/** `?asset-file` inside a worker: the same file, seen from `workers/`. */
const assetsInWorker: EsbuildPlugin = {
  name: ASSET,
  setup(esbuild) {
    esbuild.onResolve({ filter: /\?asset-file$/ }, args => ({ path: createRequire(args.importer).resolve(args.path.replace(QUERY, '')), namespace: ASSET }))
    esbuild.onLoad({ filter: /.*/, namespace: ASSET }, args => ({ contents: `export default new URL('../assets/${basename(args.path)}', import.meta.url).href` }))
  },
}

/**
 * Gives server code two imports, each a `file:` URL as text:
 * `…/pdf.worker?worker-file` (a worker bundled apart from the server, so that it never starts a second one)
 * and `package/file.ttf?asset-file`. Nitro traces what the worker imports.
 */
function emittedFiles(alias: Record<string, string>): RollupPlugin {
  const assets = new Map<string, string>()
  return {
    name: 'emitted-files',
    resolveId: {
      order: 'pre',
      async handler(source, importer) {
        const kind = QUERY.exec(source)?.[1]
        if (!kind || !importer) return null
        const bare = source.replace(QUERY, '')
        if (kind === 'asset-file') return `${MARK}asset-file:${createRequire(importer).resolve(bare)}`
        const resolved = await this.resolve(bare, importer, { skipSelf: true })
        return resolved ? `${MARK}worker-file:${resolved.id}` : `${MARK}worker-file:${resolve(dirname(importer), bare)}.ts`
      },
    },
    async load(id) {
      if (!id.startsWith(MARK)) return null
      const [kind, ...rest] = id.slice(MARK.length).split(':')
      const file = rest.join(':')
      const asset = async (path: string) => {
        const held = assets.get(path) ?? this.emitFile({ type: 'asset', fileName: `assets/${basename(path)}`, source: await readFile(path) })
        assets.set(path, held)
        return held
      }
      if (kind === ASSET) return `export default import.meta.ROLLUP_FILE_URL_${await asset(file)}`
      const out = await build({ entryPoints: [file], bundle: true, write: false, metafile: true, platform: 'node', format: 'esm', target: 'node20', packages: 'external', alias, plugins: [assetsInWorker] })
      for (const input of Object.keys(out.metafile.inputs)) {
        if (input.startsWith(`${ASSET}:`)) await asset(input.slice(ASSET.length + 1))
        else if (!input.includes(':')) this.addWatchFile(resolve(input))
      }
      const external = Object.values(out.metafile.outputs).flatMap(o => o.imports.map(i => i.path)).filter(p => !isBuiltin(p))
      for (const path of new Set(external)) await this.resolve(path, file)
      const name = basename(file).replace(/\.ts$/, '.mjs')
      const ref = this.emitFile({ type: 'asset', fileName: `workers/${name}`, source: out.outputFiles[0]!.text })
      return `export default import.meta.ROLLUP_FILE_URL_${ref}`
    },
    resolveFileUrl: ({ relativePath }) => `new URL(${JSON.stringify(relativePath)}, _import_meta_url_).href`,
  }
}

export default defineNuxtModule({
  meta: { name: 'emitted-files' },
  setup(_options, nuxt) {
    addTypeTemplate({
      filename: 'types/emitted-files.d.ts',
      getContents: () => ['worker-file', 'asset-file'].map(kind => `declare module '*?${kind}' { const url: string; export default url }`).join('\n'),
    }, { nuxt: true, nitro: true, node: true })
    nuxt.hook('nitro:config', (config) => {
      config.rollupConfig ??= {} as never
      const plugins = [config.rollupConfig!.plugins ?? []].flat()
      config.rollupConfig!.plugins = [emittedFiles({ '#shared': nuxt.options.alias['#shared']!, '#server': resolve(nuxt.options.rootDir, 'server') }), ...plugins] as never
    })
  },
})
