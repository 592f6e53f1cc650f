import { signEntry } from '#server/services/sign-visit'

export default defineRoute('POST /api/applications', ({ file, actor, house, body }) => {
  const { receipt, repeated } = signEntry({ file, actor, world: house.world }, body)
  return answer(repeated ? 200 : 201, receipt)
})
