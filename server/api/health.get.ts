export default defineRoute('GET /api/health', ({ house }) => {
  const closed = house.closedFirms.size
  return { ok: true, firms: { open: house.slugs().length - closed, closed } }
})
