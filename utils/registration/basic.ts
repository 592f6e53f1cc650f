/** A number as somebody types it to find it: outer space, a printed prefix, letter case and long dashes are forgiven. */
export const asOnLabel = (text: string): string => text.trim().toUpperCase().replace(/[‐-―−]/g, '-').replace(/^EPA\s*REG[^0-9]*/, '')

/**
 * `company-product`, the first two groups of a federal registration number: on these a distributor's product is the basic one
 * (Cal. DPR, "EPA registration number", cdpr.ca.gov/docs/label/epadef.htm). Null for a number of another form.
 */
export const basicNumber = (number: string): string | null => /^(\d+-\d+)(?:-|$)/.exec(number)?.[1] ?? null
