using BandSpec.Cli;

return CommandLine.Run(args, Terminal.OfProcess());
