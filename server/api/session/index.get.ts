export default defineRoute('GET /api/session', ({ event }) => sessionAnswer(event))
