#include "core/wording_tables.hpp"

#include <catch2/catch.hpp>

#include "tests/core/messages.hpp"

namespace swaymark::test {

TEST_CASE("sentences about tables and drawings say what is wrong and what cures it") {
  using namespace wording;
  check_sentences({csv_too_many_cells(10), table_without_rows("a table of nodes"),
                   name_in_two_files("node", "a", "tower.yaml", {3, 4}), group_without_bars("legs"),
                   frequency_and_period(), neither_frequency_nor_period(), frequency_twice("5", {2, 1}),
                   key_needs_segments("merge_within"), merge_within_too_small("0", 1e-6),
                   merge_within_too_large(1.0), segment_too_short(1e-4, 1e-3), ends_form_a_chain(2e-3, 1e-3),
                   ends_join_two_nodes("a", "b", 1e-3), segment_node_taken("n1", "lines.csv"),
                   segments_overlap("g-2", "g-1", 0.5), ends_nearly_meet("g-2", "g-1", 1.2e-3, 1e-3),
                   too_dense_for_crossings(), node_off_segments("a", 0.1, 1e-3),
                   node_on_segment("a", "g-1")});
}

TEST_CASE("small lengths of drawings are told in millimetres") {
  CHECK_THAT(wording::segment_too_short(4e-4, 1e-3).what,
             Catch::Contains("0.4 mm") && Catch::Contains("(1 mm)"));
}

TEST_CASE("a long name in another file is cut") {
  CHECK(wording::name_in_two_files("node", std::string(500, 'x'), "tower.yaml", {3, 4}).what.size() < 120);
}

}  // namespace swaymark::test
