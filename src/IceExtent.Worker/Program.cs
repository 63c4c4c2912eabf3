using IceExtent.Worker.Commands;

return await CommandLine.RunAsync(args, CommandConsole.System);
