using System;

// Generated members name types of this library; in a compliant project the compiler warns of them unless these are compliant too.
[assembly: CLSCompliant(true)]
