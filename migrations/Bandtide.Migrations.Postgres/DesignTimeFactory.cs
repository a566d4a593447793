using Bandtide.Storage;
using Bandtide.Storage.Model;
using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Design;

namespace Bandtide.Migrations.Postgres;

/// <summary>What the migration tool makes the context with. It never connects.</summary>
internal sealed class DesignTimeFactory : IDesignTimeDbContextFactory<BandtideContext>
{
    public BandtideContext CreateDbContext(string[] args)
    {
        var builder = new DbContextOptionsBuilder<BandtideContext>();
        builder.UseBandtide(StoreProvider.Postgres);
        return new(builder.Options);
    }
}
