const SCRIPT = new Set([
  'FunctionCall',
  'EvaluateScript',
  'EventDispatch',
  'RunMicrotasks',
  'TimerFire',
  'FireAnimationFrame',
  'FireIdleCallback',
])

/** CPU ms of script in each frame of the busiest page that Chromium traced; frames without script are left out. */
export function framesOf({ traceEvents }) {
  const scripts = traceEvents.filter(({ ph, name }) => ph === 'X' && SCRIPT.has(name))
  const perThread = new Map()
  for (const event of scripts) {
    const thread = `${event.pid} ${event.tid}`
    perThread.set(thread, [...(perThread.get(thread) ?? []), event])
  }
  const cpu = (events) => events.reduce((sum, { tdur, dur }) => sum + (tdur ?? dur ?? 0), 0)
  const [busiest] = [...perThread.values()].sort((a, b) => cpu(b) - cpu(a))
  if (!busiest) return []
  const { pid, tid } = busiest[0]
  const starts = traceEvents
    .filter((event) => event.pid === pid && event.tid === tid && event.name === 'BeginMainThreadFrame')
    .map(({ ts }) => ts)
    .sort((a, b) => a - b)
  const frames = new Map()
  let end = Number.NEGATIVE_INFINITY
  let at = -1
  for (const event of busiest.sort((a, b) => a.ts - b.ts || b.dur - a.dur)) {
    // what runs inside another is counted with it
    if (event.ts < end) continue
    end = event.ts + event.dur
    while (at + 1 < starts.length && starts[at + 1] <= event.ts) at++
    frames.set(at, (frames.get(at) ?? 0) + (event.tdur ?? event.dur) / 1000)
  }
  return [...frames.values()]
}
