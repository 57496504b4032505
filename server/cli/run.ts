// The command line: its commands, options and help. Each command is one function of this folder; here they are only named
// and told their options. Wrong usage ends with 2 and not with the parser's own 1.
// Invariant: `run` never throws and never ends the process; it answers with the exit code.

import { Command, CommanderError, Option } from 'commander';
import { version } from '../../package.json';
import { answerFiles, type AnswerOptions, type Format } from './answer.ts';
import { ExitCode } from './exit-codes.ts';
import { formatFiles } from './format-files.ts';
import type { Io } from './io.ts';
import { listCatalogue } from './list-catalogue.ts';
import { sayProgramFault } from './program-fault.ts';

/** Runs one command. `words` are the arguments behind the program's name. */
export async function run(words: readonly string[], io: Io): Promise<ExitCode> {
  let exitCode = ExitCode.Good;
  const program = commands(io, (code) => {
    exitCode = code;
  });
  try {
    await program.parseAsync([...words], { from: 'user' });
    return exitCode;
  } catch (error) {
    if (error instanceof CommanderError) return error.exitCode === 0 ? ExitCode.Good : ExitCode.Usage;
    sayProgramFault(error, io);
    return ExitCode.ProgramFault;
  }
}

/** Formats that are promised and not there yet, so that the answer is better than "unknown". */
const LATER_FORMATS = ['markdown', 'html', 'sarif'];

function commands(io: Io, finish: (code: ExitCode) => void): Command {
  const program = new Command('stokehold')
    .description('Checks and works out fuel scenarios (*.stoke).')
    .version(version, '--version', 'print the version')
    .helpOption('-h, --help', 'print this help')
    .helpCommand('help [command]', 'print the help of a command')
    .configureOutput({
      writeOut: io.out,
      writeErr: io.problem,
      outputError: (text, write) => write(text.replace(/^error/, 'stokehold')),
    })
    .exitOverride()
    .showHelpAfterError('(stokehold --help says how it is used)')
    .addHelpText(
      'after',
      `
Examples:
  stokehold evaluate trial.stoke                 figures, findings and expectations
  stokehold evaluate trial.stoke --brief         the leading figures and the findings
  stokehold check *.stoke --strict               findings only; warnings fail too
  stokehold evaluate trial.stoke --format json   the same answers for a program
  stokehold format trial.stoke                   bring it into shape, in place
  stokehold catalogue sodium                     what is known of a substance
  cat trial.stoke | stokehold check -            read standard input

Exit code:
  0  no errors, and every expectation that could be worked out holds
  1  an error was found or an expectation failed (with --strict: or a warning)
  2  the command is not understood, or a file named on it cannot be read
  70 the program itself failed`,
    );

  answering(program.command('check'), 'print what is wrong with scenarios, and no figures', ['text', 'json']).action(
    (files: string[], options: AnswerFlags) => finish(answerFiles(files, 'check', answerOptions(options, io), io)),
  );
  answering(program.command('evaluate'), 'print all figures, findings and expectations', ['text', 'json', 'csv'])
    .option('--brief', 'only the figures a person looks for first, and no tables (text)')
    .action((files: string[], options: AnswerFlags, command: Command) => {
      if (options.brief === true && options.format !== 'text')
        command.error(`stokehold: --brief is for text; ${options.format} gives everything`);
      finish(answerFiles(files, 'evaluate', answerOptions(options, io), io));
    });
  program
    .command('format')
    .description('bring scenarios into shape, in place; `-` from standard input to standard output')
    .argument('<files...>', 'scenario files, or - for standard input')
    .option('--check', 'write nothing; exit with 1 if a file would change')
    .action((files: string[], options: { check?: boolean }) => finish(formatFiles(files, options.check === true, io)));
  program
    .command('catalogue')
    .description('list the substances that are known, or what is known of one, with its sources')
    .argument('[word]', 'a name, an alias, a formula, or part of one')
    .action((word: string | undefined) => finish(listCatalogue(word, io)));
  program
    .command('serve')
    .description('run the language server for an editor, on the standard streams')
    .option('--stdio', 'speak on standard input and output (the only way there is)')
    .action(() => io.serve());
  return program;
}

interface AnswerFlags {
  readonly format: Format;
  readonly strict?: boolean;
  readonly color: boolean;
  readonly brief?: boolean;
}

function answering(command: Command, description: string, formats: readonly Format[]): Command {
  const format = new Option('-f, --format <format>', `how to print: ${formats.join(', ')}`)
    .default('text')
    .argParser((text) => {
      if (formats.some((known) => known === text)) return text;
      const reason = LATER_FORMATS.includes(text)
        ? 'is not written yet by this version'
        : 'is not a format of this command';
      return command.error(`stokehold: '${text}' ${reason}; take ${formats.join(', ')}`);
    });
  return command
    .description(description)
    .argument('<files...>', 'scenario files, or - for standard input')
    .addOption(format)
    .option('--strict', 'let warnings fail, too')
    .option('--no-color', 'do not colour, not even on a terminal');
}

function answerOptions({ format, strict, color, brief }: AnswerFlags, io: Io): AnswerOptions {
  const unwanted = io.environment['NO_COLOR'];
  const colour = color && io.isTerminal && (unwanted === undefined || unwanted === '');
  return { format, strict: strict === true, colour, brief: brief === true };
}
