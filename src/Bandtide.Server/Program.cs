using Bandtide.Server.Hosting;

try
{
    return await ServerProgram.RunAsync(ServerArguments.Parse(args));
}
catch (Exception failure) when (StartFailure.Describe(failure) is { } sentence)
{
    Console.Error.WriteLine(sentence);
    return 1;
}

/// <summary>The program; tests start it by this name.</summary>
public partial class Program;
