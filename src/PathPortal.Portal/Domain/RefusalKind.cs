namespace PathPortal.Portal.Domain;

/// <summary>The kinds of refusal; the HTTP API maps them to status codes.</summary>
public enum RefusalKind
{
    NotFound,

    /// <summary>The asker lacks the role, or the account is disabled.</summary>
    NotAllowed,

    /// <summary>The content of the request is wrong.</summary>
    Invalid,

    /// <summary>Somebody or something changed first; the message says what.</summary>
    Stale,

    /// <summary>The state of the thing does not allow it.</summary>
    WrongState,

    /// <summary>A second person has to do it.</summary>
    FourEyes,

    /// <summary>The password or the identity provider's sign-in has to be given again.</summary>
    NotReauthenticated,
}
