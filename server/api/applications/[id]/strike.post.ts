import { strikeEntry } from '#server/services/change-entry'

export default defineRoute('POST /api/applications/:id/strike', ({ file, actor, house, params, body }) => {
  const { receipt, repeated } = strikeEntry({ file, actor, world: house.world }, params.id, body)
  return answer(repeated ? 200 : 201, receipt)
})
