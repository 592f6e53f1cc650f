/**
 * `company-product`, the first two groups of a federal registration number: on these a distributor's product is the basic one
 * (Cal. DPR, "EPA registration number", cdpr.ca.gov/docs/label/epadef.htm). Null for a number of another form.
 */
export const basicNumber = (number: string): string | null => /^(\d+-\d+)(?:-|$)/.exec(number)?.[1] ?? null
