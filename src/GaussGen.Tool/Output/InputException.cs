using System;

namespace GaussGen.Tool.Output;

/// <summary>Something that was given to the tool and cannot be used. The message is one line that says what to do.</summary>
internal sealed class InputException(string message, Exception? inner = null) : Exception(message, inner);
