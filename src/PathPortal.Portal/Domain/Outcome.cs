using System.Diagnostics.CodeAnalysis;

namespace PathPortal.Portal.Domain;

/// <summary>What a handler answers: a value, or a refusal.</summary>
public sealed class Outcome<T>
    where T : notnull
{
    private readonly T? _value;

    private Outcome(T? value, Refusal? refusal)
    {
        _value = value;
        Refusal = refusal;
    }

    /// <summary>Null when the thing was done.</summary>
    public Refusal? Refusal { get; }

    [MemberNotNullWhen(false, nameof(Refusal))]
    public bool Succeeded => Refusal is null;

    /// <summary>The value; only when <see cref="Succeeded"/>.</summary>
    public T Value => Succeeded ? _value! : throw new InvalidOperationException("Refused: " + Refusal.Message);

    public static implicit operator Outcome<T>(T value) => new(value, null);

    public static implicit operator Outcome<T>(Refusal refusal) => new(default, refusal);
}
