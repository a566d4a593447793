using System.Text.Json.Serialization;
using Bandtide.Core.Sheets;
using Microsoft.AspNetCore.Mvc;

namespace Bandtide.Server.Api;

/// <summary>Problem details of RFC 9457 with the list of errors that the data contract adds.</summary>
public sealed class ApiProblem : ProblemDetails
{
    /// <summary>What is wrong, one entry per finding.</summary>
    [JsonPropertyName("errors")]
    [JsonPropertyOrder(10)]
    public IReadOnlyList<SheetProblem> Errors { get; init; } = [];
}
