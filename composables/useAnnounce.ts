/** Says a result to people who do not see it appear: "Signed", "Kept on this device", "Sent". */
export function useAnnounce() {
  const said = useState('announced', () => ({ text: '', turn: 0 }))
  // The turn makes the same words twice two announcements.
  const announce = (text: string) => { said.value = { text, turn: said.value.turn + 1 } }
  return { said: readonly(said), announce }
}
