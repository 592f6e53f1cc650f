/** The calendar day on which the page was asked for, the same on the server and in the browser. */
export const useToday = () => useState('today-day', () => new Date().toISOString().slice(0, 10))
