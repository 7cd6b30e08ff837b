namespace PathPortal.Engine;

/// <summary>Raised by hand when golden results change, so that a stored run says which arithmetic it came from.</summary>
public static class NumericsVersion
{
    public const int Current = 1;
}
