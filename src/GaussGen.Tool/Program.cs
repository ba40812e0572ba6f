using System;
using System.Threading;
using GaussGen.Tool;
using GaussGen.Tool.Output;

using CancellationTokenSource interruption = new();
Console.CancelKeyPress += (_, signal) =>
{
    // The first interrupt ends the work in good order, a second one at once.
    signal.Cancel = !interruption.IsCancellationRequested;
    interruption.Cancel();
};

return await Application.RunAsync(args, Terminal.OfProcess(), interruption.Token).ConfigureAwait(false);
