using System.IO;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Reports;

/// <summary>Writes a verification's outcome in one file format.</summary>
internal interface IReportWriter
{
    /// <summary>Writes the whole report; the same outcome gives the same bytes.</summary>
    void Write(VerificationResult result, Stream stream);
}
