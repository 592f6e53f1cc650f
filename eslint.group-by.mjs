// A package behind @nuxt/eslint calls Object.groupBy, which Node.js 20 lacks.
Object.groupBy ??= (items, key) => {
  const groups = Object.create(null)
  let index = 0
  for (const item of items) (groups[key(item, index++)] ??= []).push(item)
  return groups
}
