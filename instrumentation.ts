export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== 'nodejs') return
  const { startup } = await import('./lib/startup')
  await startup()
}
