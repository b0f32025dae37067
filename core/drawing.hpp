#pragma once

#include <array>
#include <string>
#include <vector>

#include "core/csv_columns.hpp"
#include "core/tower_file_values.hpp"

/// Line segments on their way to nodes and bars of a tower. Private to the reader.
namespace swaymark {

struct Segment {
  std::array<Eigen::Vector3d, 2> ends{Eigen::Vector3d::Zero(), Eigen::Vector3d::Zero()};  ///< [m]
  std::array<Place, 2> places;  ///< of the ends, in the table
  std::size_t group = 0;        ///< of the tower
};

/// What the steps of the way share.
struct Drawing {
  TableFile& table;  ///< with the faults of the segments
  const std::vector<Segment>& segments;
  NameTable& names;       ///< of nodes
  Tower& tower;           ///< with the nodes and bars stated otherwise, first
  FaultList& faults;      ///< of the tower file
  std::size_t stated;     ///< nodes of the tower before the drawing
  std::size_t first_bar;  ///< bars of the tower before the drawing
  double within;          ///< [m]: the tolerance, with a trifle for rounding
  SegmentReading reading = {};

  /// Adds a node; a fault where its name stands elsewhere already. \return its index.
  std::size_t add_node(const std::string& name, const Eigen::Vector3d& position, Place place);
};

/// Adds the nodes where segments end. End points within the tolerance of each other are one node: that of the
/// tower if one lies there too, else a new one where the first of them is drawn. New nodes are `n<k>`; k
/// counts all nodes where segments end, in the order of the file.
///
/// End points in a chain that together extend over more than the tolerance are a fault.
/// \return the node of each end: two for every segment; none if the search was given up, with a fault.
[[nodiscard]] std::vector<std::size_t> draw_nodes(Drawing& drawing);

}  // namespace swaymark
