import type { NoticeModel } from '#shared/notices/model'
import { words } from '#server/words/words'

export const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, c => `&#${c.charCodeAt(0)};`)

const INK = '#16232B'
const INK_2 = '#4A5A63'
const RULE = '#D8D2C4'

const textRow = ({ label, lines }: NoticeModel['rows'][number]): string => lines.map((line, n) => n === 0 ? `${label}: ${line}` : `  ${line}`).join('\n')

/** The notice as plain text, worth reading by itself. */
export function noticeText(model: NoticeModel): string {
  const blocks = [
    [model.title.toUpperCase(), model.place, model.address, model.when].filter(Boolean).join('\n'),
    model.leads.join('\n'),
    model.told.join('\n'),
    ...model.treatments.map(t => [`${t.heading} (${t.reference})`, ...t.rows.map(textRow)].join('\n')),
    model.rows.map(textRow).join('\n'),
    [model.emergency.heading, ...model.emergency.lines].join('\n'),
    model.cautions.join('\n'),
    words('mail.notice.attached'),
    [model.firm.name, model.firm.line].join('\n'),
  ]
  return `${blocks.filter(Boolean).join('\n\n')}\n`
}

const cell = `style="padding:6px 12px 6px 0;border-top:1px solid ${RULE};vertical-align:top"`
const htmlRow = ({ label, lines }: NoticeModel['rows'][number]): string => `<tr><th align="left" scope="row" width="120" ${cell.replace('vertical-align', `color:${INK_2};font-weight:600;vertical-align`)}>${escapeHtml(label)}</th><td ${cell}>${lines.map(escapeHtml).join('<br>')}</td></tr>`
const table = (rows: NoticeModel['rows']): string => rows.length === 0 ? '' : `<table role="presentation" width="100%" cellspacing="0" cellpadding="0" style="border-collapse:collapse;border-bottom:1px solid ${RULE}">${rows.map(htmlRow).join('')}</table>`
const paragraphs = (lines: readonly string[], style = ''): string => lines.map(line => `<p style="margin:0 0 6px;${style}">${escapeHtml(line)}</p>`).join('')

/** The notice as HTML for mail programs: one column, our colours inline, nothing fetched from anywhere. */
export function noticeHtml(model: NoticeModel): string {
  const treatments = model.treatments.map(t => `<h2 style="font-size:18px;margin:20px 0 4px">${escapeHtml(t.heading)} <span style="color:${INK_2};font-weight:400;font-size:14px">${escapeHtml(t.reference)}</span></h2>${table(t.rows)}`).join('')
  return `<!doctype html>
<html lang="${escapeHtml(model.language)}"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><title>${escapeHtml(model.subject)}</title></head>
<body style="margin:0;background:#FAF8F3;color:${INK};font:16px/1.5 'Source Sans 3','Segoe UI',Arial,sans-serif">
<div style="max-width:640px;margin:0 auto;padding:24px 20px;background:#FFFFFF;border-left:4px double #B5483A">
<p style="margin:0;color:${INK_2};font-weight:600;letter-spacing:.04em">${escapeHtml(model.title)}</p>
<h1 style="font-size:26px;line-height:1.15;margin:2px 0">${escapeHtml(model.place)}</h1>
${paragraphs([model.address, model.when].filter(Boolean), `color:${INK_2}`)}
${paragraphs(model.leads, 'font-size:20px;line-height:1.3;font-weight:600;padding-top:8px')}
${paragraphs(model.told)}
${treatments}<div style="height:12px"></div>${table(model.rows)}
<div style="border-top:2px solid ${INK};border-bottom:2px solid ${INK};padding:10px 0 4px;margin:20px 0">${paragraphs([model.emergency.heading], 'font-weight:600')}${paragraphs(model.emergency.lines)}</div>
${paragraphs([...model.cautions, words('mail.notice.attached'), `${model.firm.name} · ${model.firm.line}`], `color:${INK_2}`)}
</div></body></html>
`
}
