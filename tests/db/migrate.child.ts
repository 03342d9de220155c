import { migrateFile } from '@/db/migrate'

const { applied } = await migrateFile(process.argv[2])
process.stdout.write(applied.join(','))
