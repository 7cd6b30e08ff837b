namespace PathPortal.Engine.Control;

/// <summary>Which joint values the controller compares with the reference.</summary>
public enum FeedbackSource
{
    /// <summary>The true joints: the loop sees and corrects servo lag.</summary>
    Measured,

    /// <summary>The commanded joints: the loop does not see servo lag, which stays as an error v·τ.</summary>
    Commanded,
}
