using System.Net;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Hosting;

/// <summary>Health while it runs, and a stop that loses nothing.</summary>
public sealed class LifetimeTests
{
    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Readiness_says_why_not_and_life_goes_on(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        Assert.Equal(HttpStatusCode.OK, (await server.Visitor.GetAsync("/health/live", null)).StatusCode);
        Assert.Equal(HttpStatusCode.OK, (await server.Visitor.GetAsync("/health/ready", null)).StatusCode);

        await server.Store.SqlAsync("ALTER TABLE month_change RENAME TO month_change_gone");
        using var ready = await server.Visitor.GetAsync("/health/ready", null);
        Assert.Equal(HttpStatusCode.ServiceUnavailable, ready.StatusCode);
        var check = Assert.Single((await ready.JsonAsync())["checks"]!.AsArray())!;
        Assert.Equal("store", check["name"]!.GetValue<string>());
        Assert.Contains("month_change", check["why"]!.GetValue<string>(), StringComparison.Ordinal);
        Assert.Equal(HttpStatusCode.OK, (await server.Visitor.GetAsync("/health/live", null)).StatusCode);

        // A fault is told without its details.
        using var fault = await server.Visitor.GetAsync("bands", null);
        await fault.ProblemAsync(HttpStatusCode.InternalServerError);
        Assert.DoesNotContain("month_change", await fault.Content.ReadAsStringAsync(Ct), StringComparison.Ordinal);
        await server.Store.SqlAsync("ALTER TABLE month_change_gone RENAME TO month_change");
        Assert.Equal(HttpStatusCode.OK, (await server.Visitor.GetAsync("/health/ready", null)).StatusCode);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_stop_lets_an_upload_finish(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await using var server = await ServerProcess.ListenAsync(store);
        using var client = server.Client();
        using var made = await client.PostAsync(new Uri("stations", UriKind.Relative), Body("""{"code":"north","name":"N","latitude":1,"longitude":2,"levelUnit":"dBm"}""", "application/json"), Ct);
        var body = SampleBodies.Days(20);
        using var connection = await RawConnection.OpenAsync(server.Address);
        await connection.SendAsync(RawConnection.BulkHead(body.Length));
        await connection.SendAsync(body[..(body.Length / 2)]);
        Assert.NotNull(await connection.ReceiptAsync());

        var stopping = server.StopAsync();
        await Task.Delay(500, Ct);
        Assert.False(stopping.IsCompleted);
        await connection.SendAsync(body[(body.Length / 2)..]);
        Assert.Equal(19, (await connection.RestAsync()).Split("\"created\"").Length - 1);
        Assert.Equal(0, await stopping);
        Assert.Empty((await store.Maintenance.VerifyAsync(Ct)).Faults);
    }
}
