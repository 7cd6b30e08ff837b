namespace PathPortal.Formats.Tests.Urdf;

/// <summary>An invented file that is legal and awkward; its numbers were computed with numpy, Orocos KDL and central differences.</summary>
internal static class QuirkyUrdf
{
    public const string Text = """
        <?xml version="1.0"?>
        <!-- own test file: legal but awkward -->
        <robot name="quirky">
          <link name="world_plate"/>
          <!-- joints deliberately out of kinematic order -->
          <joint name="a_wrist" type="revolute">
            <parent link="fore"/><child link="wrist"/>
            <origin xyz="0.2  0 0 " rpy=" -1.2 0.4 0.5"/>
            <axis xyz="0 0 -1"/>
            <limit lower="-2.0" upper="2.0" effort="0" velocity="3.0"/>
          </joint>
          <joint name="m_base" type="fixed"><parent link="world_plate"/><child link="base"/><origin xyz="0 0 0.1" rpy="0 0 0.2"/><axis xyz="0 0 0"/></joint>
          <joint name="z_turn" type="continuous"><parent link="base"/><child link="turret"/><origin xyz="0 0 3e-1"/><axis xyz="0 0 1"/><limit lower="-1" upper="1" effort="10" velocity="2.5"/></joint>
          <joint name="b_lift" type="revolute"><parent link="turret"/><child link="upper"/><origin xyz=".05 .1 0" rpy="0.3 -0.2 1.1"/><axis xyz="0 2 0"/><limit lower="-1.5" upper="1.6" effort="20" velocity="2"/><safety_controller soft_lower_limit="-1.4" soft_upper_limit="1.5" k_position="10" k_velocity="5"/></joint>
          <joint name="slide" type="prismatic"><parent link="upper"/><child link="fore"/><origin xyz="0 0 0.25" rpy="0 1.5708 0"/><axis xyz="1 1 0"/><limit lower="0" upper="0.3" effort="100" velocity="0.5"/></joint>
          <joint name="echo" type="revolute"><parent link="wrist"/><child link="hand"/><origin xyz="0.1 0 0.1"/><limit lower="-3" upper="3" effort="1" velocity="6"/><mimic joint="a_wrist" multiplier="-0.5" offset="0.1"/></joint>
          <joint name="flange_joint" type="fixed"><parent link="hand"/><child link="tool0"/><origin xyz="0.02 -0.03 0.11" rpy="3.14159 -1.57 0"/></joint>
          <link name="tool0"/><link name="hand"/><link name="wrist"/><link name="fore"/><link name="upper"/><link name="turret"/><link name="base"/>
        </robot>
        """;
}
