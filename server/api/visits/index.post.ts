import { signVisit } from '#server/services/sign-visit'
import { theJobs } from '#server/services/the-jobs'

export default defineRoute('POST /api/visits', ({ file, actor, house, body }) => {
  const { receipt, repeated } = signVisit({ file, actor, world: house.world }, body)
  theJobs().jobs.poke(file.slug)
  return answer(repeated ? 200 : 201, receipt)
})
