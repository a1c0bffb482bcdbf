return FrameGen.Cli.CommandLine.Run(args, Console.Out, Console.Error);
