using Bandtide.Server.Api;
using Bandtide.Server.Components;
using Bandtide.Server.Hosting;
using Bandtide.Server.Security;
using Bandtide.Storage;
using Bandtide.Storage.Maintenance;

// The program's folder holds wwwroot and appsettings wherever the command is typed.
var builder = WebApplication.CreateBuilder(new WebApplicationOptions { Args = args, ContentRootPath = AppContext.BaseDirectory });
builder.WebHost.UseStaticWebAssets();
builder.WebHost.UseDefaultUrl(builder.Configuration);
var store = StoreSettings.Read(builder.Configuration);
builder.Services.AddBandtideStorage(store);
builder.Services.AddHosting(store.DataDirectory);
builder.Services.AddApi();
builder.Services.AddPages();

await using var app = builder.Build();
var maintenance = app.Services.GetRequiredService<StoreMaintenance>();
if (StoreCommands.Of(args) is not null)
{
    return await StoreCommands.RunAsync(args, maintenance, CancellationToken.None);
}

app.UseExceptionHandler();
app.UseSecurityHeaders();
app.UsePages();
app.UseHeadRequests();
app.UseRouting();
app.UseApi();
app.UseAntiforgery();
app.MapApi();
app.MapSetupPage();
app.MapPages();

await maintenance.MigrateAsync(app.Lifetime.ApplicationStopping);

var link = await app.Services.GetRequiredService<FirstCoordinator>().PrepareAsync(app.Lifetime.ApplicationStopping);
await app.StartAsync();
app.Announce(link);
await app.WaitForShutdownAsync();
return 0;

/// <summary>The program; tests start it by this name.</summary>
public partial class Program;
