/** A function that remembers its last answer and gives it again while the key stays the same. */
export function memo<Args extends unknown[], Result>(compute: (...args: Args) => Result): (key: string, ...args: Args) => Result {
  let last: { key: string; result: Result } | null = null
  return (key, ...args) => {
    if (last?.key !== key) last = { key, result: compute(...args) }
    return last.result
  }
}
