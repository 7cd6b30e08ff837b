namespace PathPortal.Engine.Stepping;

/// <summary>
/// Everything one group of simulations side by side holds between and within steps: one block of memory, aligned to 64 bytes and never moved, with
/// an entry of <see cref="ILane{T}.Width"/> doubles for every number. Not safe between threads. Poses and twists in base axes, SI.
/// </summary>
internal sealed unsafe class LoopWorkspace<T>
    where T : unmanaged, ILane<T>
{
    public const int Rows = 6;

    // The block is reached through pointers only; this reference keeps it alive.
    private readonly double[] block;
    private readonly nint end;
    private T* free;

    public LoopWorkspace(LoopSetup setup)
    {
        var n = setup.JointCount;
        Columns = n + 2;
        CommandSlots = setup.Controller.CommandDelay + 1;
        MeasurementSlots = setup.Controller.MeasurementDelay + 1;
        var entries = n * (16 + CommandSlots + MeasurementSlots) + Rows * (Columns + 3) + (2 * FrameSize(n)) + 80;
        block = GC.AllocateArray<double>(entries * T.Width + 8, pinned: true);
        fixed (double* start = block)
        {
            free = (T*)(((nint)start + 63) & ~(nint)63);
            end = (nint)(start + block.Length);
        }

        Joints = Take(n);
        ServoSpeed = Take(n);
        Commanded = Take(n);
        Command = Take(n);
        CommandRing = Take(n * CommandSlots);
        MeasurementRing = Take(n * MeasurementSlots);
        True = TakeFrames(n);
        Loop = TakeFrames(n);
        ReferencePoint = Take(3);
        ReferenceRotation = Take(9);
        ForwardLinear = Take(3);
        ForwardTurn = Take(3);
        ReferenceJoints = Take(n);
        ReferenceJointSpeeds = Take(n);
        JointMode = Take(1);
        AxisTask = Take(1);
        TurnRows = Take(1);
        Echo = Take(LoopTrace.EchoCount);
        TurnError = Take(3);
        TrueDistance = Take(1);
        TrueTurn = Take(1);
        Task = Take(Rows * Columns);
        SigmaSquared = Take(Rows);
        Weight = Take(Rows);
        SigmaMin = Take(1);
        SigmaMax = Take(1);
        DampingSquared = Take(1);
        Feedback = Take(n);
        Forward = Take(n);
        Demand = Take(n);
        Limited = Take(n);
        Pull = Take(n);
        Speed = Take(n);
        AccelerationDemand = Take(n);
        ToolSpeed = Take(1);
        SpeedScale = Take(1);
        PathRate = Take(1);
        NotFinite = Take(1);
        Singular = Take(1);
        BeyondLimit = Take(1);
    }

    /// <summary>Columns of <see cref="Task"/>: joints, then the two right-hand sides.</summary>
    public int Columns { get; }

    public int CommandSlots { get; }

    public int MeasurementSlots { get; }

    // State from step to step.

    /// <summary>q, true joint values.</summary>
    public T* Joints { get; }

    /// <summary>Joint speed of the servo; unused by an ideal integrator.</summary>
    public T* ServoSpeed { get; }

    /// <summary>Integral of the commands: what the joints would be without servo lag and command delay.</summary>
    public T* Commanded { get; }

    /// <summary>v, the joint speed command after limiting.</summary>
    public T* Command { get; }

    /// <summary>Commands on their way to the servo, slot × joint.</summary>
    public T* CommandRing { get; }

    /// <summary>Joint values on their way to the controller, slot × joint.</summary>
    public T* MeasurementRing { get; }

    // The reference at this step, written lane by lane.

    public T* ReferencePoint { get; }

    /// <summary>R_BD by rows.</summary>
    public T* ReferenceRotation { get; }

    /// <summary>Linear velocity fed forward (m/s).</summary>
    public T* ForwardLinear { get; }

    /// <summary>Angular velocity fed forward (rad/s).</summary>
    public T* ForwardTurn { get; }

    public T* ReferenceJoints { get; }

    public T* ReferenceJointSpeeds { get; }

    /// <summary>Mask: the lane is on a joint-interpolated move.</summary>
    public T* JointMode { get; }

    /// <summary>Mask: of orientation only the tool axis is constrained.</summary>
    public T* AxisTask { get; }

    /// <summary>Mask: orientation is constrained at all.</summary>
    public T* TurnRows { get; }

    /// <summary>Values of the reference that go to the trace as they are.</summary>
    public T* Echo { get; }

    // Results of this step.

    /// <summary>The arm as it is.</summary>
    public ArmFrames<T> True { get; }

    /// <summary>The arm as the controller sees it.</summary>
    public ArmFrames<T> Loop { get; }

    /// <summary>Orientation error in the constrained directions: base axes for a pose, tool axes x and y for an axis task.</summary>
    public T* TurnError { get; }

    /// <summary>|x_d − x| of the true arm at this instant (m).</summary>
    public T* TrueDistance { get; }

    /// <summary>Angle of the true arm's orientation error in the constrained directions (rad).</summary>
    public T* TrueTurn { get; }

    /// <summary>
    /// Ĵ with its right-hand sides feedback and feedforward as last columns, six rows; rows that constrain nothing are zero. The decomposition
    /// turns the rows until they are orthogonal.
    /// </summary>
    public T* Task { get; }

    public T* SigmaSquared { get; }

    /// <summary>1/(σ² + λ²) by row.</summary>
    public T* Weight { get; }

    public T* SigmaMin { get; }

    public T* SigmaMax { get; }

    public T* DampingSquared { get; }

    /// <summary>Joint speeds asked for by the error and the null space.</summary>
    public T* Feedback { get; }

    /// <summary>Joint speeds asked for by the feedforward.</summary>
    public T* Forward { get; }

    /// <summary>Joint speeds asked for before any limit, at the programmed rate.</summary>
    public T* Demand { get; }

    /// <summary>Joint speeds after path rate and speed limit, before the acceleration limit.</summary>
    public T* Limited { get; }

    /// <summary>Null-space velocity towards mid-range, scaled.</summary>
    public T* Pull { get; }

    /// <summary>True joint speeds at this sample.</summary>
    public T* Speed { get; }

    public T* AccelerationDemand { get; }

    public T* ToolSpeed { get; }

    public T* SpeedScale { get; }

    public T* PathRate { get; }

    /// <summary>Mask: a value of this step is not finite.</summary>
    public T* NotFinite { get; }

    /// <summary>Mask: the undamped inverse is past its condition limit.</summary>
    public T* Singular { get; }

    /// <summary>Mask: a demand is beyond its limit.</summary>
    public T* BeyondLimit { get; }

    /// <summary>One number of one lane.</summary>
    public static ref double At(T* entry, int lane) => ref ((double*)entry)[lane];

    /// <summary>Sets a mask in one lane.</summary>
    public static void SetMask(T* entry, int lane, bool value) => ((long*)entry)[lane] = value ? -1 : 0;

    public static bool IsSet(T* entry, int lane) => ((long*)entry)[lane] != 0;

    private static int FrameSize(int n) => 6 * n + 12;

    private ArmFrames<T> TakeFrames(int n) => new(Take(3 * n), Take(3 * n), Take(9), Take(3));

    private T* Take(int entries)
    {
        var taken = free;
        free += entries;
        return (nint)free <= end ? taken : throw new InvalidOperationException("The workspace is too small for what it holds.");
    }
}
