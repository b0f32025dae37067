#pragma once

#include <random>

#include "core/tower.hpp"

/// Towers made by code, for laws and for sizes no file is written for.
namespace swaymark::test {

/// A tower of steel (E 210 GPa, 7850 kg/m3) with one group "bars" of one section, without nodes and bars.
[[nodiscard]] Tower bare_tower(int dimensions, double area = 1e-3);

/// Adds a node, named by its number from 1. \return its index
std::size_t add_node(Tower& tower, const Eigen::Vector3d& position);
/// Adds a bar of the last group.
void add_bar(Tower& tower, std::size_t from, std::size_t to);
/// Fixes all axes the tower has at the node.
void fix(Tower& tower, std::size_t node);
/// Carries a mass [kg] at the node.
void carry(Tower& tower, std::size_t node, double mass);

/// Stands a tank of water, named "water", on the nodes. \param radius, depth [m]
void stand_tank(Tower& tower, const std::vector<std::size_t>& nodes, double radius, double depth,
                bool rigid = false);

/// A fixed-free rod along x of equal elements. \param length [m]
[[nodiscard]] Tower rod(int elements, double length, MassScheme scheme);

/// Two posts of 3 m, 4 m apart on held feet (nodes 1 and 2), and a beam on them (3 to 4), without a diagonal:
/// it sways. \param lean  of the posts inwards, horizontal over vertical.
[[nodiscard]] Tower portal(double lean = 0.0);

/// A mast whose plan is a regular polygon: legs, an X in every face of every panel, horizontals, and plan
/// bracing from a node in the middle of each level, so that its symmetry is that of the polygon. Base nodes
/// are fixed.
struct Mast {
  int legs = 4;
  int panels = 4;
  double radius = 1.0;        ///< of the base [m]
  double top_radius = 0.5;    ///< [m]
  double panel_height = 2.0;  ///< [m]
  double turn = 0.0;          ///< of the plan about z [rad]
  double top_mass = 200.0;    ///< [kg], shared by the nodes of the top polygon
};
[[nodiscard]] Tower regular_mast(const Mast& mast);

/// A truss of random nodes, areas and carried masses; each free node is tied to one more earlier node than it
/// has axes, so that it is stable.
[[nodiscard]] Tower random_truss(int dimensions, int free_nodes, std::mt19937& random);

}  // namespace swaymark::test
