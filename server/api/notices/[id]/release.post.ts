import { showNotice } from '#server/services/notices'
import { releaseNotice } from '#server/services/release-notices'
import { theJobs } from '#server/services/the-jobs'

export default defineRoute('POST /api/notices/:id/release', ({ file, actor, house, params }) => {
  releaseNotice({ file, actor, world: house.world }, params.id)
  theJobs().jobs.poke(file.slug)
  return answer(202, showNotice(file, actor, params.id))
})
