import { backup } from './backup'
import { createTeamCommand } from './createTeam'
import { resetPassword } from './resetPassword'
import { restore } from './restore'

/** A command: what it says of itself, and what it does with its arguments. Returns the closing sentence. */
interface Command {
  help: string
  run: (args: string[]) => Promise<string>
}

const COMMANDS: Record<string, Command> = {
  backup,
  restore,
  'reset-password': resetPassword,
  'team-create': createTeamCommand,
}

async function main([name = '', ...args]: string[]): Promise<number> {
  const command = COMMANDS[name]
  if (!command) {
    console.log(
      Object.values(COMMANDS)
        .map(({ help }) => help)
        .join('\n\n'),
    )
    return name === '--help' ? 0 : 1
  }
  if (args.includes('--help')) {
    console.log(command.help)
    return 0
  }
  try {
    console.log(await command.run(args))
    return 0
  } catch (error) {
    console.error(error instanceof Error ? error.message : String(error))
    return 1
  }
}

process.exitCode = await main(process.argv.slice(2))
