import { checkNode, install } from './lib/steps.mjs'

checkNode()
install()
