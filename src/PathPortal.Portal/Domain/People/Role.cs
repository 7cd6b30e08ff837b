namespace PathPortal.Portal.Domain.People;

/// <summary>What an account may be in a plant. Stored by name.</summary>
public enum Role
{
    /// <summary>Reads everything of the plant.</summary>
    Viewer,

    /// <summary>Uploads revisions and submits them for review.</summary>
    Author,

    /// <summary>Keeps cells true.</summary>
    CellOwner,

    /// <summary>Sets criteria.</summary>
    Lead,

    /// <summary>Gives roles in the plant and sets its rules.</summary>
    Administrator,
}
