using System.Security.Cryptography;
using System.Text;
using Bandtide.Storage.Keys;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Keys;

public sealed class KeyStoreTests
{
    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task An_issued_key_is_known_by_its_text_and_no_other(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");

        var (scope, key) = await store.Keys.IssueAsync(station.Id, "first", Ct);

        Assert.Equal((station.Id, false, false), (scope.StationId, scope.LoopbackOnly, scope.IsCoordinator));
        Assert.Equal(scope, await store.Keys.FindAsync(key, Ct));
        Assert.Null(await store.Keys.FindAsync(key + "x", Ct));
        Assert.Null(await store.Keys.FindAsync(key.ToUpperInvariant(), Ct));
        Assert.Null(await store.Keys.FindAsync("", Ct));
        Assert.Equal(43, key.Length);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task The_store_holds_the_hash_and_not_the_key(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var (_, key) = await store.Keys.IssueAsync(null, "coordinator", Ct);

        Assert.Equal(SHA256.HashData(Encoding.UTF8.GetBytes(key)), Assert.IsType<byte[]>(await store.SqlAsync("SELECT hash FROM access_key")));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_revoked_key_is_unknown_everywhere_at_once(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await using var second = store.OpenAgain();
        var north = await store.AddStationAsync("north");
        var south = await store.AddStationAsync("south");
        var (scope, key) = await store.Keys.IssueAsync(north.Id, "first", Ct);
        var (_, other) = await store.Keys.IssueAsync(north.Id, "second", Ct);

        Assert.False(await store.Keys.RevokeAsync(south.Id, scope.KeyId, Ct));
        Assert.NotNull(await second.Keys.FindAsync(key, Ct));
        Assert.True(await store.Keys.RevokeAsync(north.Id, scope.KeyId, Ct));
        Assert.False(await store.Keys.RevokeAsync(north.Id, scope.KeyId, Ct));

        Assert.Null(await second.Keys.FindAsync(key, Ct));
        Assert.NotNull(await second.Keys.FindAsync(other, Ct));
        Assert.Equal(["second"], (await store.Keys.ListAsync(north.Id, Ct)).Select(entry => entry.Note));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_given_text_becomes_a_key_with_exactly_the_rights_last_given(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        Assert.False(await store.Keys.HasCoordinatorAsync(Ct));

        var first = await store.Keys.EnsureAsync("a text of at least thirty-two characters", null, loopbackOnly: false, "set-up", Ct);
        var again = await store.Keys.EnsureAsync("a text of at least thirty-two characters", null, loopbackOnly: false, "set-up", Ct);
        Assert.True(first.IsCoordinator);
        Assert.Equal(first, again);
        Assert.True(await store.Keys.HasCoordinatorAsync(Ct));

        var demo = await store.Keys.EnsureAsync("demo", station.Id, loopbackOnly: true, "demonstration", Ct);
        await store.Keys.RevokeAsync(station.Id, demo.KeyId, Ct);
        Assert.Null(await store.Keys.FindAsync("demo", Ct));
        await store.Keys.EnsureAsync("demo", station.Id, loopbackOnly: true, "demonstration", Ct);
        Assert.Equal(new KeyScope(demo.KeyId, station.Id, true), await store.Keys.FindAsync("demo", Ct));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Instances_that_start_together_may_ensure_the_same_key(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);

        var scopes = await Task.WhenAll(Enumerable.Range(0, 8).Select(_ =>
            Task.Run(() => store.Keys.EnsureAsync("the same text", null, loopbackOnly: false, "set-up", Ct))));

        Assert.Single(scopes.Distinct());
    }
}
