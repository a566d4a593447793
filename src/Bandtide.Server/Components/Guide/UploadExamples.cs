using System.Globalization;
using System.Text;
using Bandtide.Core.Time;

namespace Bandtide.Server.Components.Guide;

/// <summary>The commands and scripts of the Data page, for one server, station and day: they work as printed, and tests run them.</summary>
/// <param name="Server">Address of the server without a closing slash.</param>
/// <param name="Station">Code of the station.</param>
/// <param name="Date">A UTC date that has ended.</param>
internal sealed record UploadExamples(string Server, string Station, DateOnly Date)
{
    /// <summary>Name of the environment variable that holds the key.</summary>
    public const string KeyVariable = "BANDTIDE_KEY";

    /// <summary>Name of the sheet's file.</summary>
    public string SheetFile => DateText.Format(Date) + ".csv";

    /// <summary>A small day sheet.</summary>
    public static string Sheet { get; } = MakeSheet();

    /// <summary>One day by <c>curl</c>.</summary>
    public string Curl => $"""
        curl --fail-with-body -X PUT {Server}/api/v1/stations/{Station}/days/{DateText.Format(Date)} \
          -H "Authorization: Bearer ${KeyVariable}" -H "Content-Type: text/csv" \
          --data-binary @{SheetFile}
        """;

    /// <summary>Many days by <c>curl</c>.</summary>
    public string CurlBulk => $"""
        curl --fail-with-body -X POST {Server}/api/v1/stations/{Station}/days \
          -H "Authorization: Bearer ${KeyVariable}" -H "Content-Type: text/csv" \
          --data-binary @days.csv
        """;

    /// <summary>One day by a Python script that needs nothing but Python 3.</summary>
    public string Python => $$"""
        # send_day.py: sends one day sheet and prints the receipt.
        # Use: python3 send_day.py {{SheetFile}}
        import os
        import pathlib
        import sys
        import urllib.error
        import urllib.request

        SERVER = "{{Server}}"
        STATION = "{{Station}}"

        sheet = pathlib.Path(sys.argv[1])
        request = urllib.request.Request(
            f"{SERVER}/api/v1/stations/{STATION}/days/{sheet.stem}",
            data=sheet.read_bytes(),
            method="PUT",
            headers={
                "Authorization": "Bearer " + os.environ["{{KeyVariable}}"],
                "Content-Type": "text/csv",
            },
        )
        try:
            with urllib.request.urlopen(request, timeout=60) as answer:
                print(answer.read().decode())
        except urllib.error.HTTPError as refusal:
            sys.exit(f"{refusal.code}: {refusal.read().decode()}")
        """;

    /// <summary>One day by PowerShell, Windows PowerShell 5.1 or later.</summary>
    public string PowerShell => $$"""
        # Send-Day.ps1: sends one day sheet and prints the receipt.
        # Use: ./Send-Day.ps1 {{SheetFile}}
        param([string] $Path = "{{SheetFile}}")

        $server = "{{Server}}"
        $station = "{{Station}}"

        $sheet = Get-Item $Path
        Invoke-RestMethod -Method Put `
          -Uri "$server/api/v1/stations/$station/days/$($sheet.BaseName)" `
          -Headers @{ Authorization = "Bearer $env:{{KeyVariable}}" } `
          -ContentType "text/csv" -InFile $sheet.FullName
        """;

    private static string MakeSheet()
    {
        var text = new StringBuilder("hour,band,sweeps,occupancy,signal,level,level_p90,floor\n");
        foreach (var (hour, occupancy, signal) in new[] { (20, 0.6125, -71.30), (21, 0.5840, -72.15), (22, 0.5012, -74.60) })
        {
            text.Append(CultureInfo.InvariantCulture, $"{hour},bc-49m,720,{occupancy:0.0000},{signal:0.00},{signal - 3:0.00},{signal + 14:0.00},-98.40\n");
        }

        return text.ToString();
    }
}
