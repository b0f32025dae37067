#pragma once

#include <array>
#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include <Eigen/Core>

#include "core/axis.hpp"
#include "core/error.hpp"
#include "core/request.hpp"

/// The tower as the engineer states it: a value, SI units throughout (m, kg, s, N, Pa, Hz).
///
/// References between parts are indices into the tower's own lists. Each part keeps the place it was read
/// from so that a fault found later can still be shown in the file.
namespace swaymark {

struct Material {
  std::string name;
  double youngs_modulus = 0.0;  ///< E [Pa] > 0
  double density = 0.0;         ///< [kg/m3] >= 0
  std::optional<double> yield;  ///< [Pa]
  Place place;
};

struct Section {
  std::string name;
  double area = 0.0;                 ///< [m2] > 0
  std::optional<double> radius;      ///< smallest radius of gyration [m]
  std::optional<std::string> curve;  ///< buckling curve a0, a, b, c, d (EN 1993-1-1)
  Place place;
  std::optional<double> perimeter = {};  ///< of the outline [m], what paint and ice cover
  std::string size = {};  ///< as the tables write it, `L 80x80x8`; empty where not given by size
};

struct Node {
  std::string name;
  Eigen::Vector3d position = Eigen::Vector3d::Zero();  ///< [m]; axes the tower does not have are 0
  Place place;
};

/// Bars of one name that share a section and a material, unless a bar has its own.
struct Group {
  std::string name;
  std::size_t section = 0;
  std::size_t material = 0;
  Place place;
  double area_factor = 1.0;       ///< > 0, on the area of its bars (corrosion): mass and stiffness follow
  double stiffness_factor = 1.0;  ///< > 0, on their axial stiffness alone (slip of joints)
};

struct Bar {
  std::size_t group = 0;
  std::size_t from = 0;
  std::size_t to = 0;
  std::size_t number = 0;  ///< within its group, from 1
  Place place;
  std::optional<std::size_t> section = {};   ///< its own, where it differs from the group's
  std::optional<std::size_t> material = {};  ///< likewise
  std::string name = {};                     ///< its own, where it is not named by group and number
};

/// A rigid rectangular footing on the ground's surface.
struct Pad {
  double length = 0.0;         ///< along x [m] > 0
  double width = 0.0;          ///< along y [m] > 0
  double shear_modulus = 0.0;  ///< of the soil, G [Pa] > 0
  double poisson = 0.0;        ///< of the soil, 0 <= nu < 0.5
};

/// What holds one node: an axis is fixed, on a spring to the ground, or free.
struct Support {
  std::size_t node = 0;
  std::array<bool, 3> fixed{};
  std::array<double, 3> spring{};  ///< [N/m]; 0 where there is none
  Place place;
  std::optional<Pad> pad = {};  ///< that the springs were computed from
};

/// A spring between a node and its neighbours in the directions in which the node is free by itself.
struct Stabiliser {
  std::size_t node = 0;
  double stiffness = 0.0;  ///< [N/m] > 0
  Place place;
};

/// A carried mass shared equally by nodes (a discrete ancillary).
struct NodeMass {
  std::vector<std::size_t> nodes;
  double total = 0.0;  ///< [kg] for all nodes together
  std::string label;
  Place place;
};

/// A carried mass along bars that moves with them as their own mass does (a linear ancillary).
struct LineMass {
  std::optional<std::size_t> group;  ///< every bar where empty
  double per_length = 0.0;           ///< [kg/m]
  std::string label;
  Place place;
};

/// A share of the bars' own mass: bolts, gussets, paint.
struct Allowance {
  std::optional<std::size_t> group;  ///< every bar where empty
  double share = 0.0;                ///< fraction of the bars' own mass
  std::string label;
  Place place;
};

/// Ice all around bars, over a range of heights where one is given.
struct IceMass {
  std::optional<std::size_t> group;  ///< every bar where empty
  double thickness = 0.0;            ///< t, square to the surface [m] > 0
  double density = 0.0;              ///< [kg/m3] > 0
  std::optional<double> from;        ///< z [m]; from the lowest node where empty
  std::optional<double> to;          ///< z [m]; to the highest node where empty
  std::string label;
  Place place;
};

/// A liquid in an upright circular tank that stands on nodes.
struct Liquid {
  std::vector<std::size_t> nodes;
  double radius = 0.0;   ///< of the tank, R [m] > 0
  double depth = 0.0;    ///< of the liquid, H [m] > 0
  double density = 0.0;  ///< [kg/m3] > 0
  bool rigid = false;    ///< all of it moves with the nodes
  std::string label;
  Place place;
  /// The tower's node that stands for the mass that sloshes, in the middle of `nodes`; none where rigid.
  std::optional<std::size_t> node = {};
};

/// Nodes that the pattern of a lattice leaves loose, whatever else is written by hand, and what would hold
/// them.
struct LooseNodes {
  std::string what;                ///< a sentence without a full stop
  std::vector<std::size_t> nodes;  ///< that can move
  std::size_t motions = 0;         ///< independent ones at most, with the base held
  std::vector<std::string> cures;
};

/// Where two segments meet away from a common node, or a node stands on a segment that does not end there.
struct SegmentCrossing {
  std::string first;   ///< a bar; the one that ends there, if one does
  std::string second;  ///< empty where a node of no segment stands on the first
  Eigen::Vector3d position = Eigen::Vector3d::Zero();  ///< [m]
  std::optional<std::size_t> node = {};                ///< that stands there
  bool at_end = false;                                 ///< the first ends on the second
};

/// What was made of a drawing by line segments, so that a report can state it.
struct SegmentReading {
  std::string file;
  std::size_t segments = 0;
  std::size_t nodes = 0;      ///< their end points are
  std::size_t named = 0;      ///< of these, stated by hand or by the lattice too
  std::size_t moved = 0;      ///< end points that stand elsewhere than drawn
  double largest_move = 0.0;  ///< [m]
  std::size_t largest_move_node = 0;
  double merge_within = 0.0;  ///< [m]
  bool merge_within_stated = false;
  bool split = false;  ///< the bars end at the crossings
  std::vector<SegmentCrossing> crossings;
};

enum class MassScheme { consistent, lumped, averaged };

struct Tower {
  std::string file;                ///< the name it was read from, for messages and reports
  std::vector<std::string> files;  ///< by Place::file: that one, then those it names; empty if made in memory
  std::string title;
  int dimensions = 3;

  std::vector<Material> materials;
  std::vector<Section> sections;
  std::vector<Node> nodes;
  std::vector<Group> groups;
  std::vector<Bar> bars;
  std::vector<Support> supports;        ///< at most one per node
  std::vector<Stabiliser> stabilisers;  ///< at most one per node
  std::vector<NodeMass> node_masses;
  std::vector<LineMass> line_masses;
  std::vector<Allowance> allowances;
  std::vector<IceMass> ice;
  std::vector<Liquid> liquids;
  std::vector<LooseNodes> lattice_leaves_loose;  ///< of a tower written by panels
  std::optional<SegmentReading> segments;        ///< of a tower drawn by line segments

  MassScheme mass_scheme = MassScheme::consistent;
  std::vector<double>
      damping;  ///< fractions of critical: one for every mode, or mode by mode; empty: not given

  ModeRequest modes;
  std::vector<BandStatement> bands;
  std::vector<SpectrumStatement> spectra;
  std::optional<SeismicStatement> seismic;
  std::optional<BaseStudyStatement> base_study;

  [[nodiscard]] std::vector<Axis> axes() const { return axes_of(dimensions); }
  /// Its own name, or `legs-3` after its group and number.
  [[nodiscard]] std::string bar_name(std::size_t bar) const;
  [[nodiscard]] const Section& section_of(const Bar& bar) const;
  [[nodiscard]] const Material& material_of(const Bar& bar) const;
  /// Whether the node stands for the sloshing mass of a liquid.
  [[nodiscard]] bool sloshes(std::size_t node) const;
  /// [m2], the group's area factor applied
  [[nodiscard]] double area_of(const Bar& bar) const;
  /// The tower's extent [m]: the diagonal of the box around its nodes.
  [[nodiscard]] double extent() const;
};

[[nodiscard]] std::string_view name_of(MassScheme scheme);
[[nodiscard]] std::string_view name_of(ModalRule rule);
[[nodiscard]] std::string_view name_of(DirectionalRule rule);
[[nodiscard]] std::string_view name_of(BandDirection direction);

}  // namespace swaymark
