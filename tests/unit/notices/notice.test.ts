import { describe, expect, it } from 'vitest'
import type { EntryFacts } from '#shared/records/entry'
import { keepOffUntil } from '#shared/notices/keep-off'
import { NoticeModelSchema } from '#shared/notices/model'
import { NoticeStopped, noticeModel } from '#shared/notices/notice'
import { words } from '#server/words/words'
import { noticeEntry, noticeSource } from './examples'

const model = (...args: Parameters<typeof noticeSource>) => noticeModel(noticeSource(...args), words)
const lead = (reentry: EntryFacts['reentry']) => model([noticeEntry({ reentry })]).leads

describe('a notice in words', () => {
  it('tells what, where, when, by whom and what to do', () => {
    const notice = model()
    expect(NoticeModelSchema.parse(notice)).toEqual(notice)
    expect(notice).toMatchObject({
      title: 'Treatment notice', subject: 'Treatment notice: 22 Quarry Lane, May 14, 2026', place: '22 Quarry Lane', when: 'Thursday, May 14, 2026, 8:30\u00A0am to 9:12\u00A0am EDT',
      told: ['Treated: outside wall and ground beside it, against ants and earwigs.', 'Nothing was applied indoors.'],
    })
    expect(notice.treatments[0]?.rows).toEqual([
      { label: 'Product', lines: ['Sillgard 6.4 CS (demo), EPA Reg. No. 990014-27, signal word CAUTION', 'Active ingredients: Demothrin 6.40%'] },
      { label: 'Amount', lines: ['0.90\u00A0fl oz', '3.0\u00A0gal of finished spray'] },
      { label: 'Where', lines: ['Outside wall and ground beside it, 1,116\u00A0sq ft'] },
      { label: 'Weather', lines: ['8:32\u00A0am: 64\u00A0°F, wind 4\u00A0mph from the south-west, clear'] },
    ])
    expect(notice.rows).toEqual([
      { label: 'By', lines: ['Tomás Nguyễn, Commercial applicator C5-81172 (NY)'] },
      { label: 'Also done', lines: ['Gaps sealed'] },
      { label: 'Please do', lines: ['Trim the ivy back from the wall by a hand.', 'Seal the gap at the cellar door by June 1.'] },
      { label: 'Next visit', lines: ['about Monday, July 13, 2026'] },
    ])
  })

  it('leaves out what was struck and says that it tells what was amended', () => {
    const notice = model([noticeEntry({ method: { code: null, text: 'Gone' } }, {}, 'struck'), noticeEntry({}, {}, 'amended')])
    expect(notice.treatments.map(t => t.heading)).toEqual(['Foundation band'])
    expect(notice.told).toContain('This notice tells the record as it was amended after the visit.')
  })

  it('is stopped where the country has no checked emergency block, and where nothing is left to tell', () => {
    expect(() => model(undefined, {}, { country: 'CA' })).toThrow(new NoticeStopped('no-emergency-block', 'CA'))
    expect(() => model([noticeEntry({}, {}, 'struck')])).toThrow(new NoticeStopped('nothing-to-tell', 'US'))
  })

  // 911, Poison Control, NPIC: EPA, "In Case of Pesticide Emergency" (snapshot of 19 January 2017); npic.orst.edu/factsheets/pcc-npic.html
  it('carries the emergency numbers and never calls anything safe', () => {
    const all = JSON.stringify(model())
    for (const number of ['911', '1-800-222-1222', '1-800-858-7378']) expect(all).toContain(number)
    expect(all).not.toMatch(/\bsafe/i)
    expect(all).not.toMatch(/notices\.|paper\.|common\.|catalogues\./)
  })
})

describe('keeping off', () => {
  it.each<[EntryFacts['reentry'], string]>([
    [{ until: 'dry' }, 'Keep people and animals off the treated areas until they are fully dry.'],
    [{ until: 'dusts-settled' }, 'Keep people and animals away from the treated areas until all dust has settled.'],
    [{ until: 'hours', hours: '4' }, 'Keep people and animals off the treated areas until 1:11\u00A0pm EDT on Thursday, May 14, 2026: 4 hours from the finish, as the label says.'],
    [{ until: 'label', words: 'Do not enter until sprays have dried.' }, 'Keep people and animals off the treated areas as the label says: “Do not enter until sprays have dried.”'],
    [{ until: 'none-stated' }, 'The label states no time for keeping off the treated areas. Do not touch what was applied.'],
  ])('is told in the label’s own condition: %j', (reentry, sentence) => {
    expect(lead(reentry)).toEqual([sentence])
  })

  it('names the areas where conditions differ', () => {
    expect(model([noticeEntry(), noticeEntry({ reentry: { until: 'ventilated' }, areas: [{ place: { code: 'kitchen', text: 'Kitchen' }, setting: 'indoors', size: null, how: 'estimated' }] })]).leads).toEqual([
      'Outside wall and ground beside it: keep people and animals off until fully dry.',
      'Kitchen: keep people and animals out until ventilated as the label says.',
    ])
  })

  it('counts hours as they pass when clocks change, and never ends early', () => {
    // clocks go back on 1 November 2026 at 2:00 (15 U.S.C. 260a)
    expect(keepOffUntil('2026-11-01T00:30:00-04:00', '4', 'America/New_York')).toBe('2026-11-01T03:30:00-05:00')
    expect(keepOffUntil('2026-05-14T09:10:20-04:00', '0.5', 'America/New_York')).toBe('2026-05-14T09:41:00-04:00')
  })
})
