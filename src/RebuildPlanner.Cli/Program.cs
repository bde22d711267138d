using RebuildPlanner.Cli;

return Shell.Run(args, Terminal.OfConsole());
