namespace GaussGen.Tool.Reports.Html;

/// <summary>Numbers of things in words.</summary>
internal static class Counted
{
    /// <summary>"1 table", "12 tables".</summary>
    public static string Of(int count, string one, string many) => $"{count} {(count == 1 ? one : many)}";
}
