using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Arms;

/// <summary>
/// One joint of a serial chain in the engine's inner form: a constant pose in the frame of the joint before, then motion about or along the
/// local z axis by <c>Sign · q + Zero</c>.
/// </summary>
/// <param name="Name">Unique in the arm, shown to people.</param>
/// <param name="PoseInPrevious">A_i: this joint's frame, at motion zero, in the moved frame of the joint before (in the base for the first).</param>
/// <param name="Sign">+1 or −1: sense of the controller's joint value.</param>
/// <param name="Zero">Added to <c>Sign · q</c> (rad or m).</param>
public sealed record Joint(string Name, JointKind Kind, RigidTransform PoseInPrevious, int Sign, double Zero, JointLimits Limits);
