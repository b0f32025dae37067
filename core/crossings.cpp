#include "core/crossings.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <cstdint>
#include <optional>
#include <tuple>

#include "core/point_grid.hpp"

namespace swaymark {

namespace {

using Eigen::Vector3d;

constexpr std::size_t kMostPairs = 300'000'000;  // looked at: some seconds
constexpr std::size_t kMostVisits = 20'000'000;  // of cells by sticks
constexpr std::size_t kMostMeetings = 1'000'000;
// Of the grid, in cells: towers like to stand in the planes through the origin, which shall not be borders.
constexpr double kShift = 0.382;

struct Line {
  Vector3d start;
  Vector3d along;  // of length 1
  double length;
};

// Everything that passes through one cell of a grid; cells with the same number only cost time.
struct Visit {
  std::uint64_t cell;
  std::size_t what;  // a stick, or a point behind all sticks
  bool operator<(const Visit& other) const { return std::tie(cell, what) < std::tie(other.cell, other.what); }
};

class Search {
 public:
  Search(const std::vector<Vector3d>& points, const std::vector<Stick>& sticks, double within)
      : points_(points), sticks_(sticks), within_(within) {
    lines_.reserve(sticks.size());
    double total = 0.0;
    for (const Stick& stick : sticks) {
      const Vector3d way = points[stick.to] - points[stick.from];
      lines_.push_back({points[stick.from], way.normalized(), way.norm()});
      total += lines_.back().length;
    }
    width_ = std::max(total / static_cast<double>(std::max<std::size_t>(sticks.size(), 1)), 8.0 * within);
  }

  Meetings run() {
    for (std::size_t s = 0; s < sticks_.size() && found_.complete; ++s) enter_stick(s);
    enter_loose_points();
    std::sort(visits_.begin(), visits_.end());
    each_cell([&](std::size_t begin, std::size_t end) { pairs_ += (end - begin) * (end - begin) / 2; });
    if (pairs_ > kMostPairs) found_.complete = false;  // known before any time is spent on them
    each_cell([&](std::size_t begin, std::size_t end) { look_into(begin, end); });
    put_in_order();
    return std::move(found_);
  }

 private:
  // Calls `look(begin, end)` for the visits of every cell, as long as the search goes on.
  template <typename Look>
  void each_cell(Look look) const {
    for (std::size_t begin = 0; begin < visits_.size() && found_.complete;) {
      std::size_t end = begin + 1;
      while (end < visits_.size() && visits_[end].cell == visits_[begin].cell) ++end;
      look(begin, end);
      begin = end;
    }
  }

  [[nodiscard]] std::int64_t cell_of(double coordinate) const {
    return static_cast<std::int64_t>(std::floor(coordinate / width_ + kShift));
  }
  // The lower one of a cell.
  [[nodiscard]] double border_of(std::int64_t cell) const {
    return (static_cast<double>(cell) - kShift) * width_;
  }

  // Goes along the axis in which the stick is longest, and in each layer of cells across it enters those
  // that the piece within the layer may touch.
  void enter_stick(std::size_t s) {
    const Line& line = lines_[s];
    const Vector3d end = line.start + line.length * line.along;
    Eigen::Index lead = 0;
    line.along.cwiseAbs().maxCoeff(&lead);
    const double low = std::min(line.start[lead], end[lead]);
    const double high = std::max(line.start[lead], end[lead]);
    const std::int64_t last = cell_of(high + within_);
    for (std::int64_t layer = cell_of(low - within_); layer <= last && found_.complete; ++layer) {
      const double from = std::clamp(border_of(layer) - within_, low, high);
      const double to = std::clamp(border_of(layer + 1) + within_, low, high);
      const auto at = [&](double coordinate) -> Vector3d {
        return line.start + (coordinate - line.start[lead]) / line.along[lead] * line.along;
      };
      enter_box(at(from).cwiseMin(at(to)), at(from).cwiseMax(at(to)), lead, layer, s);
    }
  }

  void enter_box(const Vector3d& low, const Vector3d& high, Eigen::Index lead, std::int64_t layer,
                 std::size_t s) {
    const Eigen::Index a = (lead + 1) % 3;
    const Eigen::Index b = (lead + 2) % 3;
    std::array<std::int64_t, 3> cell{};
    cell[static_cast<std::size_t>(lead)] = layer;
    for (std::int64_t i = cell_of(low[a] - within_); i <= cell_of(high[a] + within_); ++i) {
      for (std::int64_t j = cell_of(low[b] - within_); j <= cell_of(high[b] + within_); ++j) {
        cell[static_cast<std::size_t>(a)] = i;
        cell[static_cast<std::size_t>(b)] = j;
        visits_.push_back({mixed(cell), s});
      }
    }
    if (visits_.size() > kMostVisits) found_.complete = false;
  }

  // Points where no stick ends; the others are met with the stick that ends there.
  void enter_loose_points() {
    std::vector<bool> is_end(points_.size(), false);
    for (const Stick& stick : sticks_) is_end[stick.from] = is_end[stick.to] = true;
    for (std::size_t p = 0; p < points_.size(); ++p) {
      const Vector3d& at = points_[p];
      if (!is_end[p])
        visits_.push_back({mixed({cell_of(at.x()), cell_of(at.y()), cell_of(at.z())}), sticks_.size() + p});
    }
  }

  void look_into(std::size_t begin, std::size_t end) {
    for (std::size_t i = begin; i < end && visits_[i].what < sticks_.size(); ++i) {
      if (found_.list.size() > kMostMeetings) {
        found_.complete = false;
        return;
      }
      for (std::size_t j = i + 1; j < end; ++j) {
        if (visits_[j].what == visits_[i].what) continue;  // two cells with one number
        if (visits_[j].what < sticks_.size()) {
          meet(visits_[i].what, visits_[j].what);
        } else {
          meet_point(visits_[i].what, visits_[j].what - sticks_.size());
        }
      }
    }
  }

  void meet_point(std::size_t s, std::size_t point) {
    const Line& line = lines_[s];
    const Vector3d way = points_[point] - line.start;
    const double at = way.dot(line.along);
    if (at <= 0.0 || at >= line.length || (way - at * line.along).norm() > within_) return;
    found_.list.push_back({MeetingKind::node_on, s, s, point, points_[point], 0.0});
  }

  void meet(std::size_t a, std::size_t b) {
    const Stick& first = sticks_[a];
    const Stick& second = sticks_[b];
    const bool start_shared = first.from == second.from || first.from == second.to;
    const bool end_shared = first.to == second.from || first.to == second.to;
    if (start_shared && end_shared) return;
    const double overlap = overlap_of(lines_[a], lines_[b]);
    if (overlap > 0.0) {
      const Vector3d middle = 0.5 * (points_[second.from] + points_[second.to]);
      found_.list.push_back({MeetingKind::overlap, a, b, 0, middle, overlap});
    } else if (!start_shared && !end_shared) {
      touch(a, b);
    }
  }

  // The length for which `other` runs along `line` within the tolerance; 0 where they only meet.
  [[nodiscard]] double overlap_of(const Line& line, const Line& other) const {
    const double slope = other.along.dot(line.along);
    if (std::abs(slope) < 0.5) return 0.0;  // most pairs
    const Vector3d way = other.start - line.start;
    const double at_start = way.dot(line.along);
    const double at_end = at_start + other.length * slope;
    const double from = std::max(std::min(at_start, at_end), 0.0);
    const double to = std::min(std::max(at_start, at_end), line.length);
    if (to - from <= 2.0 * within_) return 0.0;
    for (const double at : {from, to}) {
      const Vector3d there = way + (at - at_start) / slope * other.along;
      if ((there - at * line.along).norm() > within_) return 0.0;
    }
    return to - from;
  }

  void touch(std::size_t a, std::size_t b) {
    const Line& u = lines_[a];
    const Line& v = lines_[b];
    const Vector3d way = u.start - v.start;
    const double c = u.along.dot(v.along);
    const double across = 1.0 - c * c;  // squared sine of the angle between them
    const double uw = u.along.dot(way);
    const double vw = v.along.dot(way);
    double s = across > 1e-12 ? std::clamp((c * vw - uw) / across, 0.0, u.length) : 0.0;
    double t = c * s + vw;
    if (t < 0.0 || t > v.length) {
      t = std::clamp(t, 0.0, v.length);
      s = std::clamp(c * t - uw, 0.0, u.length);
    }
    const Vector3d on_u = u.start + s * u.along;
    const Vector3d on_v = v.start + t * v.along;
    if ((on_u - on_v).norm() > within_) return;
    const auto end_of_u = end_at(sticks_[a], u, s);
    const auto end_of_v = end_at(sticks_[b], v, t);
    if (end_of_u && end_of_v) {
      const double apart = (points_[*end_of_u] - points_[*end_of_v]).norm();
      found_.list.push_back({MeetingKind::nearly_ends, a, b, 0, on_u, apart});
    } else if (end_of_u) {
      found_.list.push_back({MeetingKind::end_on, a, b, *end_of_u, points_[*end_of_u], 0.0});
    } else if (end_of_v) {
      found_.list.push_back({MeetingKind::end_on, b, a, *end_of_v, points_[*end_of_v], 0.0});
    } else {
      found_.list.push_back({MeetingKind::crossing, a, b, 0, 0.5 * (on_u + on_v), 0.0});
    }
  }

  [[nodiscard]] std::optional<std::size_t> end_at(const Stick& stick, const Line& line, double at) const {
    if (std::min(at, line.length - at) > within_) return std::nullopt;
    return at < line.length - at ? stick.from : stick.to;
  }

  // Several cells may show the same meeting.
  void put_in_order() {
    const auto key = [&](const Meeting& m) {
      const std::size_t early = std::min(m.first, m.second);
      const std::size_t late = std::max(m.first, m.second);
      const double at = (m.position - lines_[early].start).dot(lines_[early].along);
      return std::make_tuple(early, at, late, m.kind, m.node);
    };
    const auto same = [](const Meeting& a, const Meeting& b) {
      return std::tie(a.kind, a.first, a.second, a.node) == std::tie(b.kind, b.first, b.second, b.node);
    };
    auto& list = found_.list;
    std::sort(list.begin(), list.end(), [&](const Meeting& a, const Meeting& b) { return key(a) < key(b); });
    list.erase(std::unique(list.begin(), list.end(), same), list.end());
  }

  const std::vector<Vector3d>& points_;
  const std::vector<Stick>& sticks_;
  double within_;
  double width_ = 1.0;
  std::vector<Line> lines_;
  std::vector<Visit> visits_;
  std::size_t pairs_ = 0;
  Meetings found_;
};

}  // namespace

Meetings find_meetings(const std::vector<Vector3d>& points, const std::vector<Stick>& sticks, double within) {
  return Search(points, sticks, within).run();
}

}  // namespace swaymark
