export interface Deferred<T> {
  promise: Promise<T>
  resolve: (value: T) => void
}

/** A promise that is settled from outside. */
export function deferred<T>(): Deferred<T> {
  let resolve: (value: T) => void = () => {}
  const promise = new Promise<T>((settle) => {
    resolve = settle
  })
  return { promise, resolve }
}
