#include "core/assembly.hpp"

#include <cmath>

#include <fmt/format.h>

#include "core/neighbour_spring.hpp"

namespace swaymark {

namespace {

using Triplets = std::vector<Eigen::Triplet<double>>;

// Entries of one matrix over all degrees of freedom, sent to the blocks they belong to.
struct Blocks {
  const DofMap& dofs;
  Triplets free_free;
  Triplets fixed_free;
  Triplets all;

  void add(Index row, Index column, double value) {
    all.emplace_back(row, column, value);
    const Index free_column = dofs.free(column);
    if (free_column < 0) return;
    if (dofs.free(row) >= 0) {
      free_free.emplace_back(dofs.free(row), free_column, value);
    } else {
      fixed_free.emplace_back(dofs.fixed(row), free_column, value);
    }
  }
};

SparseMatrix matrix_of(const Triplets& triplets, Index rows, Index columns) {
  SparseMatrix matrix(rows, columns);
  matrix.setFromTriplets(triplets.begin(), triplets.end());
  return matrix;
}

void add_stiffness(const BarElement& bar, const DofMap& dofs, Blocks& blocks) {
  const auto& axes = dofs.axes();
  const std::array ends{bar.from, bar.to};
  for (std::size_t p = 0; p < 2; ++p) {
    for (std::size_t q = 0; q < 2; ++q) {
      const double sign = p == q ? 1.0 : -1.0;
      for (std::size_t i = 0; i < axes.size(); ++i) {
        for (std::size_t j = 0; j < axes.size(); ++j) {
          const double value = bar.direction[index_of(axes[i])] * bar.direction[index_of(axes[j])];
          if (value == 0.0) continue;
          blocks.add(dofs.dof(ends[p], i), dofs.dof(ends[q], j), sign * bar.axial_stiffness * value);
        }
      }
    }
  }
}

void add_mass(const BarElement& bar, MassShares shares, const DofMap& dofs, Blocks& blocks) {
  const double own = bar.mass() * shares.own_end;
  const double other = bar.mass() * shares.other_end;
  for (std::size_t i = 0; i < dofs.axes().size(); ++i) {
    const Index from = dofs.dof(bar.from, i);
    const Index to = dofs.dof(bar.to, i);
    if (own != 0.0) {
      blocks.add(from, from, own);
      blocks.add(to, to, own);
    }
    if (other != 0.0) {
      blocks.add(from, to, other);
      blocks.add(to, from, other);
    }
  }
}

// k [1, -a; -a^T, a a^T] with a = 1/n for each of the n others.
void add_link(const Link& link, Blocks& blocks) {
  const double share = 1.0 / static_cast<double>(link.others.size());
  blocks.add(link.dof, link.dof, link.stiffness);
  for (const Index i : link.others) {
    blocks.add(link.dof, i, -share * link.stiffness);
    blocks.add(i, link.dof, -share * link.stiffness);
    for (const Index j : link.others) blocks.add(i, j, share * share * link.stiffness);
  }
}

void add_spring(const NeighbourSpring& spring, Blocks& blocks) {
  for (const auto& [row, a] : spring.elongation) {
    for (const auto& [column, b] : spring.elongation) blocks.add(row, column, spring.stiffness * a * b);
  }
}

void add_liquid(const Liquid& liquid, const DofMap& dofs, Blocks& blocks) {
  const LiquidSplit split = split_liquid(liquid);
  for (std::size_t k = 0; k < dofs.axes().size(); ++k) {
    const double each = liquid_on_node(liquid, split, dofs.axes()[k]);
    for (const std::size_t node : liquid.nodes) blocks.add(dofs.dof(node, k), dofs.dof(node, k), each);
    if (!liquid.node || dofs.axes()[k] == Axis::z) continue;
    blocks.add(dofs.dof(*liquid.node, k), dofs.dof(*liquid.node, k), split.convective);
  }
}

SparseMatrix axial_forces(const std::vector<BarElement>& bars, const DofMap& dofs) {
  Triplets triplets;
  for (std::size_t b = 0; b < bars.size(); ++b) {
    for (std::size_t i = 0; i < dofs.axes().size(); ++i) {
      const double value = bars[b].axial_stiffness * bars[b].direction[index_of(dofs.axes()[i])];
      const Index from = dofs.free(dofs.dof(bars[b].from, i));
      const Index to = dofs.free(dofs.dof(bars[b].to, i));
      if (from >= 0) triplets.emplace_back(static_cast<Index>(b), from, -value);
      if (to >= 0) triplets.emplace_back(static_cast<Index>(b), to, value);
    }
  }
  return matrix_of(triplets, static_cast<Index>(bars.size()), dofs.free_count());
}

void check_finite(const Tower& tower, const std::vector<BarElement>& bars) {
  for (std::size_t b = 0; b < bars.size(); ++b) {
    if (std::isfinite(bars[b].axial_stiffness) && std::isfinite(bars[b].mass())) continue;
    throw ComputationError({fmt::format("the stiffness or mass of bar {} is not finite", tower.bar_name(b)),
                            "check its modulus, density, area and ends"});
  }
}

}  // namespace

Assembly assemble(const Tower& tower) {
  Assembly result{DofMap(tower), bar_elements(tower), {}, {}, {}, {}, {}, {}, {}, {}, {}};
  const DofMap& dofs = result.dofs;
  check_finite(tower, result.bars);
  Blocks stiffness{dofs, {}, {}, {}};
  Blocks mass{dofs, {}, {}, {}};
  const MassShares shares = mass_shares(tower.mass_scheme);
  for (const BarElement& bar : result.bars) {
    add_stiffness(bar, dofs, stiffness);
    add_mass(bar, shares, dofs, mass);
  }
  for (const NodeMass& carried : tower.node_masses) {
    const double each = carried.total / static_cast<double>(carried.nodes.size());
    for (const std::size_t node : carried.nodes) {
      for (std::size_t i = 0; i < dofs.axes().size(); ++i)
        mass.add(dofs.dof(node, i), dofs.dof(node, i), each);
    }
  }
  for (const Liquid& liquid : tower.liquids) add_liquid(liquid, dofs, mass);
  result.links = liquid_links(tower, dofs);
  for (const Link& link : result.links) add_link(link, stiffness);
  result.stabilisers = neighbour_springs(tower, dofs);
  for (const NeighbourSpring& spring : result.stabilisers) add_spring(spring, stiffness);
  result.springs = Eigen::VectorXd::Zero(dofs.free_count());
  for (const Support& support : tower.supports) {
    for (std::size_t i = 0; i < dofs.axes().size(); ++i) {
      const double spring = support.spring[static_cast<std::size_t>(dofs.axes()[i])];
      const Index dof = dofs.dof(support.node, i);
      if (spring <= 0.0 || dofs.free(dof) < 0) continue;
      stiffness.add(dof, dof, spring);
      result.springs(dofs.free(dof)) = spring;
    }
  }
  const Index free = dofs.free_count();
  const Index fixed = dofs.fixed_count();
  result.stiffness = matrix_of(stiffness.free_free, free, free);
  result.support_stiffness = matrix_of(stiffness.fixed_free, fixed, free);
  result.mass = matrix_of(mass.free_free, free, free);
  result.support_mass = matrix_of(mass.fixed_free, fixed, free);
  result.mass_all = matrix_of(mass.all, dofs.dof_count(), dofs.dof_count());
  result.axial = axial_forces(result.bars, dofs);
  return result;
}

Eigen::VectorXd rigid_translation(const DofMap& dofs, Axis axis) {
  Eigen::VectorXd r = Eigen::VectorXd::Zero(dofs.dof_count());
  for (Index dof = 0; dof < dofs.dof_count(); ++dof) {
    if (dofs.axis_of(dof) == axis) r(dof) = 1.0;
  }
  return r;
}

Eigen::VectorXd rigid_tilt(const Tower& tower, const DofMap& dofs, Axis direction,
                           const Eigen::Vector3d& centre) {
  Eigen::VectorXd w = Eigen::VectorXd::Zero(dofs.dof_count());
  for (Index dof = 0; dof < dofs.dof_count(); ++dof) {
    const Eigen::Vector3d arm = tower.nodes[dofs.node_of(dof)].position - centre;
    if (dofs.axis_of(dof) == direction) w(dof) = arm.z();
    if (dofs.axis_of(dof) == Axis::z) w(dof) = -arm[index_of(direction)];
  }
  return w;
}

Eigen::VectorXd inertia_vector(const Assembly& assembly, const Eigen::VectorXd& rigid) {
  return assembly.dofs.free_part(assembly.mass_all * rigid);
}

Eigen::MatrixXd inertia_vectors(const Assembly& assembly) {
  const auto& axes = assembly.dofs.axes();
  Eigen::MatrixXd drive(assembly.mass.rows(), static_cast<Index>(axes.size()));
  for (std::size_t k = 0; k < axes.size(); ++k)
    drive.col(static_cast<Index>(k)) = inertia_vector(assembly, rigid_translation(assembly.dofs, axes[k]));
  return drive;
}

}  // namespace swaymark
