using Bandtide.Storage.Maintenance;

namespace Bandtide.Server.Hosting;

/// <summary>Commands that act on the store and end: <c>migrate</c>, <c>rebuild</c>, <c>verify</c>, <c>backup FILE</c>.</summary>
internal static class StoreCommands
{
    private static readonly string[] Names = ["migrate", "rebuild", "verify", "backup"];

    /// <summary>The command of a command line, or <c>null</c> when the server is to start.</summary>
    public static string? Of(IReadOnlyList<string> args) => args.Count > 0 && Names.Contains(args[0], StringComparer.Ordinal) ? args[0] : null;

    /// <summary>Runs a command; words go to standard error, results to standard output.</summary>
    /// <returns>0 when it succeeded, 1 otherwise.</returns>
    public static async Task<int> RunAsync(IReadOnlyList<string> args, StoreMaintenance store, CancellationToken ct)
    {
        switch (args[0])
        {
            case "migrate":
                await store.MigrateAsync(ct);
                Console.WriteLine("The store has the current shape.");
                return 0;
            case "rebuild":
                await store.MigrateAsync(ct);
                await store.RebuildAsync(new RebuildNotice(), ct);
                Console.WriteLine("All month tiles were made anew from the day sheets.");
                return 0;
            case "verify":
                await store.MigrateAsync(ct);
                return Report(await store.VerifyAsync(ct));
            default:
                return args.Count > 1 ? await BackupAsync(store, args[1], ct) : Fail("backup needs the name of a file to write.");
        }
    }

    private static int Report(VerifyReport report)
    {
        foreach (var fault in report.Faults)
        {
            Console.Error.WriteLine($"{fault.Station} {fault.Place}: {fault.Message}");
        }

        Console.WriteLine(string.Create(
            System.Globalization.CultureInfo.InvariantCulture,
            $"{report.Stations} stations, {report.Sheets} day sheets, {report.Revisions} earlier revisions, {report.Tiles} month tiles: {report.Faults.Count} faults."));
        return report.IsSound ? 0 : 1;
    }

    private static async Task<int> BackupAsync(StoreMaintenance store, string file, CancellationToken ct)
    {
        switch (await store.BackupAsync(file, ct))
        {
            case BackupOutcome.Done done:
                Console.WriteLine(string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{done.File}: {done.Bytes} bytes, checked."));
                return 0;
            case BackupOutcome.Refused refused:
                return Fail(refused.Reason);
            default:
                return 1;
        }
    }

    private static int Fail(string message)
    {
        Console.Error.WriteLine(message);
        return 1;
    }

    private sealed class RebuildNotice : IProgress<RebuildProgress>
    {
        public void Report(RebuildProgress value) => Console.Error.WriteLine(string.Create(
            System.Globalization.CultureInfo.InvariantCulture, $"{value.StationsDone} of {value.Stations} stations, {value.Months} months"));
    }
}
