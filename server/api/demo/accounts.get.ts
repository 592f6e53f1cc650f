import { demoAccounts } from '#server/services/demonstration'

export default defineRoute('GET /api/demo/accounts', ({ house }) => ({ accounts: demoAccounts(house) }))
