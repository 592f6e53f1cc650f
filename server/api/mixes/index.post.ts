import { signMix } from '#server/services/sign-visit'

export default defineRoute('POST /api/mixes', ({ file, actor, house, body }) => {
  const { receipt, repeated } = signMix({ file, actor, world: house.world }, body)
  return answer(repeated ? 200 : 201, receipt)
})
