using Bandtide.Benchmarks;
using Bandtide.Testing.Databases;
using Npgsql;

PostgresServer? postgres = null;

// One command per group of figures; "all" runs every one. Each prints rows of a Markdown table: what, median, spread.
var commands = new Dictionary<string, Func<Task>>(StringComparer.Ordinal)
{
    ["put"] = () => EachStoreAsync(UploadBenchmarks.PutAsync),
    ["bulk"] = () => EachStoreAsync(UploadBenchmarks.BulkAsync),
    ["store"] = () => EachStoreAsync((kind, _) => UploadBenchmarks.StoreAsync(kind)),
    ["heatmap"] = () => EachStoreAsync((kind, _) => HeatmapBenchmarks.RunAsync(kind, stations: 1000)),
    ["pooling"] = PoolingBenchmark.RunAsync,
    ["interval-coverage"] = CoverageBenchmark.RunAsync,
    ["start"] = StartBenchmark.RunAsync,
};

var asked = args is ["all"] ? [.. commands.Keys] : args;
if (asked.Length == 0 || asked.Any(name => !commands.ContainsKey(name)))
{
    Console.Error.WriteLine($"Name what to measure: all, or some of {string.Join(", ", commands.Keys)}.");
    return 1;
}

Machine.Describe();
foreach (var name in asked)
{
    Console.WriteLine($"\n{name}\n\n| what | median | spread |\n|---|---|---|");
    await commands[name]();
}

if (postgres is not null)
{
    await postgres.DisposeAsync();
}

return 0;

// One durable server for the whole run; the stores that benchmarks open find it by the variable.
async Task EachStoreAsync(Func<StoreKind, string?, Task> run)
{
    await run(StoreKind.Sqlite, null);
    postgres ??= await PostgresServer.StartAsync(durable: true);
    var database = await postgres.CreateDatabaseAsync();
    Environment.SetEnvironmentVariable("BANDTIDE_TEST_POSTGRES", new NpgsqlConnectionStringBuilder(database) { Database = "postgres" }.ToString());
    await run(StoreKind.Postgres, database);
}
