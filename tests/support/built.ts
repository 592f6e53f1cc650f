import { existsSync } from 'node:fs'

/** The api and browser projects run the production build; `npm test` makes it first. */
export default function setup() {
  if (!existsSync('.output/server/index.mjs')) throw new Error('No build: run `npm run build` first (`npm test` does it).')
}
