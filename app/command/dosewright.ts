/** The program itself: runs the command that the arguments name and leaves with its exit code. */
import { runCommand } from './run-command.ts'
import { leaveQuietlyWithoutReader } from './streams.ts'

leaveQuietlyWithoutReader()
process.exitCode = await runCommand(process.argv.slice(2))
