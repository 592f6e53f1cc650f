import { showNotice } from '#server/services/notices'
import { tellOnPaper } from '#server/services/release-notices'
import { theJobs } from '#server/services/the-jobs'

export default defineRoute('POST /api/notices/:id/handed-over', async ({ file, actor, house, params }) => {
  await tellOnPaper({ file, actor, world: house.world }, params.id, 'handed-over', report => theJobs().pdf.draw(report))
  return showNotice(file, actor, params.id)
})
