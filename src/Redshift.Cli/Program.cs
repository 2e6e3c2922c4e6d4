using Redshift.Cli;

return await CommandLine.InvokeAsync(args).ConfigureAwait(false);
