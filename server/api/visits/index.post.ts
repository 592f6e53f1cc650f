import { signVisit } from '#server/services/sign-visit'

export default defineRoute('POST /api/visits', ({ file, actor, house, body }) => {
  const { receipt, repeated } = signVisit({ file, actor, world: house.world }, body)
  return answer(repeated ? 200 : 201, receipt)
})
