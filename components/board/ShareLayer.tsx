export function ShareLayer() {
  return null
}
