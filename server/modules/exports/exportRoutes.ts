import { labelSheetSchema } from '../../../shared/api/exports.ts'
import { jobParamsSchema } from '../../../shared/api/jobs.ts'
import { deriveJob } from '../../../shared/derive/deriveJob.ts'
import { labelItems } from '../../../shared/labels/labelItems.ts'
import { layoutLabels } from '../../../shared/labels/layoutLabels.ts'
import { jobOf } from '../../../shared/model/jobDocument.ts'
import { AppError } from '../../../shared/errors.ts'
import { answered, defineRoute, noInput, type Route } from '../../http/routeTable.ts'
import type { JobsContext } from '../jobs/jobsContext.ts'
import { readDocument } from '../jobs/readDocument.ts'
import { writeJobWorkbook } from './jobWorkbook.ts'
import { labelsPdf } from './labelsPdf.ts'

const spreadsheet = 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet'

/** A file name that any system takes, with the real one beside it (RFC 6266). */
const attachment = (name: string, ending: string) => `attachment; filename="${name.replace(/[^A-Za-z0-9 ._-]/g, '_')}.${ending}"; filename*=UTF-8''${encodeURIComponent(name)}.${ending}`

/** Files made of a job: the workbook, and sheets of labels. */
export const exportRoutes = (jobs: JobsContext): readonly Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/jobs/:jobId/schedule.xlsx',
    action: 'job.export',
    params: jobParamsSchema,
    query: noInput,
    body: noInput,
    handle: async ({ member, response }, { params }) => {
      const doc = await readDocument(jobs, { companyId: member.companyId, jobId: params.jobId })
      const { runs, findings } = deriveJob(doc)
      response.setHeader('Content-Type', spreadsheet)
      response.setHeader('Content-Disposition', attachment(`${jobOf(doc).name} cable schedule`, 'xlsx'))
      await writeJobWorkbook(response, { doc, runs, findings, day: jobs.now().toISOString().slice(0, 10) })
      return answered
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/jobs/:jobId/labels.pdf',
    action: 'label.print',
    params: jobParamsSchema,
    query: noInput,
    body: labelSheetSchema,
    handle: async ({ member, response }, { params, body }) => {
      const doc = await readDocument(jobs, { companyId: member.companyId, jobId: params.jobId })
      const items = labelItems(doc, deriveJob(doc).runs, body)
      if (!items.length) throw new AppError('refused', 'There is no label to print: the runs are dropped or gone, or no copy was asked for')
      response.setHeader('Content-Type', 'application/pdf')
      response.setHeader('Content-Disposition', attachment(`${jobOf(doc).name} labels`, 'pdf'))
      labelsPdf(layoutLabels(items, body), { title: `${jobOf(doc).name}: labels` }).pipe(response)
      return answered
    },
  }),
]
