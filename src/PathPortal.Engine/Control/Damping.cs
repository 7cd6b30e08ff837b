namespace PathPortal.Engine.Control;

/// <summary>
/// Damping of the inverse: q̇ = Jᵀ(JJᵀ + λ²I)⁻¹u on the scaled Jacobian.
/// </summary>
/// <param name="Kind">Which law gives λ².</param>
/// <param name="Lambda">λ for constant damping, λ_max for the variable law; in units of the scaled Jacobian, above zero unless <see cref="DampingKind.None"/>.</param>
/// <param name="Epsilon">ε of the variable law: damping starts where σ_min falls below it.</param>
public sealed record Damping(DampingKind Kind, double Lambda, double Epsilon)
{
    public static Damping None { get; } = new(DampingKind.None, 0, 0);

    public static Damping Constant(double lambda) => new(DampingKind.Constant, lambda, 0);

    public static Damping Variable(double lambdaMax, double epsilon) => new(DampingKind.Variable, lambdaMax, epsilon);
}
