#pragma once

#include <Eigen/Core>
#include <Eigen/SparseCore>

namespace swaymark {

using Eigen::Index;

/// Column-major sparse matrix of doubles; K, M and their kin.
using SparseMatrix = Eigen::SparseMatrix<double>;

}  // namespace swaymark
