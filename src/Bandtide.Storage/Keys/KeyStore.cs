using System.Buffers.Binary;
using System.Buffers.Text;
using System.Security.Cryptography;
using System.Text;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Model;
using Microsoft.EntityFrameworkCore;

namespace Bandtide.Storage.Keys;

/// <summary>Keys: random, stored as SHA-256 alone, compared in constant time.</summary>
/// <remarks>
/// A key has 256 random bits, so a fast hash suffices (NIST SP 800-63B-4 asks for a slow one where secrets have few). The
/// index holds the hash's first eight bytes: what its timing could tell is about the hash of a guess, not about a key.
/// </remarks>
public sealed class KeyStore
{
    private const int KeyBytes = 32;

    private readonly StoreDatabase database;
    private readonly TimeProvider clock;

    internal KeyStore(StoreDatabase database, TimeProvider clock) => (this.database, this.clock) = (database, clock);

    /// <summary>Makes a key and returns its text, which is never seen again.</summary>
    /// <param name="stationId">Its station, or <c>null</c> for a coordinator's key.</param>
    /// <param name="note">What it is for.</param>
    /// <param name="ct">Cancels.</param>
    public async Task<(KeyScope Scope, string Key)> IssueAsync(int? stationId, string note, CancellationToken ct)
    {
        var key = Base64Url.EncodeToString(RandomNumberGenerator.GetBytes(KeyBytes));
        return (await EnsureAsync(key, stationId, loopbackOnly: false, note, ct), key);
    }

    /// <summary>Makes a given text a key with exactly these rights, also when it was revoked (set-up and demonstration). Idempotent.</summary>
    public async Task<KeyScope> EnsureAsync(string key, int? stationId, bool loopbackOnly, string note, CancellationToken ct)
    {
        var hash = HashOf(key);
        return await database.WriteAsync(async session =>
        {
            await using var context = await session.ContextAsync(ct);
            var row = await context.AccessKeys.SingleOrDefaultAsync(stored => stored.Hash == hash, ct);
            if (row is null)
            {
                row = new() { Lookup = LookupOf(hash), Hash = hash, Note = note, CreatedAt = clock.GetUtcNow().ToUnixTimeMilliseconds() };
                context.AccessKeys.Add(row);
            }

            (row.StationId, row.LoopbackOnly, row.Note, row.RevokedAt) = (stationId, loopbackOnly, note, null);
            await context.SaveChangesAsync(ct);
            return (ScopeOf(row), true);
        }, ct);
    }

    /// <summary>The rights of a presented key, or <c>null</c> when it is unknown or revoked.</summary>
    public async Task<KeyScope?> FindAsync(string presented, CancellationToken ct)
    {
        var hash = HashOf(presented);
        return await database.ReadAsync(async session =>
        {
            await using var command = session.Command(
                "SELECT id, station_id, loopback_only, hash FROM access_key WHERE lookup = @lookup AND revoked_at IS NULL");
            command.Add("@lookup", LookupOf(hash));
            await using var reader = await command.ExecuteReaderAsync(ct);
            while (await reader.ReadAsync(ct))
            {
                if (CryptographicOperations.FixedTimeEquals(hash, reader.GetFieldValue<byte[]>(3)))
                {
                    return new KeyScope(reader.GetInt32(0), reader.IsDBNull(1) ? null : reader.GetInt32(1), reader.GetBoolean(2));
                }
            }

            return null;
        }, ct);
    }

    /// <summary>The good keys of a station, oldest first.</summary>
    public Task<IReadOnlyList<KeyEntry>> ListAsync(int stationId, CancellationToken ct) =>
        database.ReadAsync<IReadOnlyList<KeyEntry>>(async session =>
        {
            await using var context = await session.ContextAsync(ct);
            var rows = await context.AccessKeys.AsNoTracking()
                .Where(row => row.StationId == stationId && row.RevokedAt == null).OrderBy(row => row.Id).ToListAsync(ct);
            return rows.ConvertAll(row => new KeyEntry(row.Id, row.Note, DateTimeOffset.FromUnixTimeMilliseconds(row.CreatedAt)));
        }, ct);

    /// <summary>Whether any coordinator's key is good.</summary>
    public Task<bool> HasCoordinatorAsync(CancellationToken ct) => database.ReadAsync(async session =>
    {
        await using var context = await session.ContextAsync(ct);
        return await context.AccessKeys.AnyAsync(row => row.StationId == null && row.RevokedAt == null, ct);
    }, ct);

    /// <summary>Revokes a key of a station; false when the station has no such good key.</summary>
    public async Task<bool> RevokeAsync(int stationId, int keyId, CancellationToken ct)
    {
        var now = clock.GetUtcNow().ToUnixTimeMilliseconds();
        return await database.WriteAsync(async session =>
        {
            await using var context = await session.ContextAsync(ct);
            var revoked = await context.AccessKeys
                .Where(row => row.Id == keyId && row.StationId == stationId && row.RevokedAt == null)
                .ExecuteUpdateAsync(row => row.SetProperty(stored => stored.RevokedAt, now), ct);
            return (revoked == 1, true);
        }, ct);
    }

    private static byte[] HashOf(string key) => SHA256.HashData(Encoding.UTF8.GetBytes(key));

    private static long LookupOf(byte[] hash) => BinaryPrimitives.ReadInt64BigEndian(hash);

    private static KeyScope ScopeOf(AccessKeyRow row) => new(row.Id, row.StationId, row.LoopbackOnly);
}
