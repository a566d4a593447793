using Bandtide.Storage.Network;
using Microsoft.Extensions.DependencyInjection;

namespace Bandtide.Storage.Tests;

public sealed class StorageServicesTests
{
    [Theory]
    [InlineData("mysql")]
    [InlineData("Sqlite")]
    [InlineData("")]
    public void A_wrong_provider_is_told_what_is_allowed(string provider)
    {
        var message = Assert.Throws<InvalidOperationException>(
            () => new ServiceCollection().AddBandtideStorage(new() { Provider = provider })).Message;

        Assert.Contains("sqlite", message, StringComparison.Ordinal);
        Assert.Contains("postgres", message, StringComparison.Ordinal);
        Assert.Contains($"'{provider}'", message, StringComparison.Ordinal);
    }

    [Fact]
    public void PostgreSQL_without_a_connection_string_names_the_setting()
    {
        using var services = new ServiceCollection().AddBandtideStorage(new() { Provider = "postgres" }).BuildServiceProvider();

        var message = Assert.Throws<InvalidOperationException>(() => services.GetRequiredService<NetworkStore>()).Message;

        Assert.Contains("ConnectionStrings:Bandtide", message, StringComparison.Ordinal);
    }

    [Fact]
    public void The_embedded_store_lies_under_the_folder_where_the_command_was_typed() =>
        Assert.Equal(Path.Combine(Environment.CurrentDirectory, "data", "bandtide.db"), new StoreOptions().FilePath);
}
