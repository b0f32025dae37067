#include "core/wording.hpp"

#include <catch2/catch.hpp>

#include "tests/core/messages.hpp"

namespace swaymark::test {

namespace {

const std::string kLong(10'000, 'x');

// Every message that carries words of the file, with hostile ones.
std::vector<Message> messages_about(std::string_view text) {
  using namespace wording;
  return {not_yaml(text),
          tag_not_used(text),
          version_not_ours(text),
          key_twice(text, {3, 1}),
          key_unknown(text, "a band", std::nullopt, {"label"}),
          key_empty(text),
          wrong_kind(text, "a length", "a map"),
          not_a_choice("modes", text, {"CQC", "SRSS"}),
          not_a_number(text, "a length", "m"),
          decimal_comma(text),
          number_out_of_range(text),
          unknown_unit(text, "a length", "m"),
          wrong_dimension(text, "a length", "m", "a mass"),
          no_unit_database(text, "m"),
          must_be_positive("E", text),
          must_not_be_negative("density", text),
          not_a_fraction("damping", text, 2.0),
          not_a_whole_number("count", text, 10),
          too_far_away(text),
          name_unknown("node", text, std::nullopt),
          name_twice("node", text, {3, 1}),
          name_reserved("group", text),
          coordinates_count(text, 2, {"x", "y", "z"}),
          size_not_read(text),
          size_unknown(text, {"L 80x80x8"}),
          size_family_unknown(text, {"L", "CHS", "SHS"}),
          size_listed_already(text),
          no_other_files(text),
          csv_not_a_number("area", text, "cm2"),
          csv_not_a_number(text, "x", text),
          csv_word_without_unit(text)};
}

}  // namespace

TEST_CASE("every message says what is wrong and what would cure it") {
  using namespace wording;
  std::vector<Message> messages = messages_about("word");
  const std::vector<Message> plain{file_too_long(2, 1),
                                   invalid_character(),
                                   empty_file(),
                                   several_documents(),
                                   too_deep(24),
                                   too_many_values(3),
                                   aliases_too_large(3),
                                   alias_to_itself(),
                                   not_a_tower(),
                                   version_missing(),
                                   key_is_no_word("a list"),
                                   key_missing("E", "material 'steel'", "E: 210 GPa"),
                                   keys_exclude("area", "tube", "section 'leg'"),
                                   one_key_of("'area' or 'tube'", "section 'leg'"),
                                   wants_map("a band", "'rotor'"),
                                   not_yet_supported("'lattice': towers written by panels are"),
                                   axis_unknown("'q'", {"x", "z"}),
                                   nothing_listed("bars", "[from, to] pairs"),
                                   bar_is_pair(),
                                   bar_to_itself("legs-1", "5"),
                                   bar_without_length("legs-1", "5", "6"),
                                   bar_twice("legs-1", "legs-2", "5", "6"),
                                   nodes_coincide("5", "6"),
                                   held_twice("5", "x", {4, 1}),
                                   holds_nothing(),
                                   tube_wall(0.1, 0.06),
                                   band_reversed(2.0, 1.0),
                                   points_need_two(),
                                   point_is_pair(),
                                   periods_must_rise(1.0, 0.5),
                                   log_needs_positive(),
                                   correction_needs_damping(),
                                   seismic_needs_damping(),
                                   no_direction_excited(),
                                   radius_beside_size("section 'leg'"),
                                   double_needs_angle(),
                                   gap_needs_double(),
                                   csv_too_long(2, 1),
                                   csv_empty(),
                                   csv_quote(),
                                   csv_separator(),
                                   csv_cells(2, 3)};
  messages.insert(messages.end(), plain.begin(), plain.end());
  check_sentences(messages);
}

TEST_CASE("words of the file cannot flood a message or break its line") {
  check_sentences(messages_about(kLong + "\n\x1B[31m"));
  check_sentences(messages_about("a\nb\x1B[31m"));
}

TEST_CASE("a slip of the pen is answered by the nearest word and anything else by all that are known") {
  CHECK(wording::key_unknown("membres", "a tower file", "members", {"members", "modes"}).cure ==
        "did you mean 'members'?");
  CHECK(wording::key_unknown("weather", "a tower file", std::nullopt, {"members", "modes"}).cure ==
        "known here: members or modes");
  CHECK(wording::not_a_choice("modes", "cqc", {"CQC", "SRSS"}).cure ==
        "did you mean 'CQC'? possible: CQC or SRSS");
  CHECK(wording::name_unknown("section", "legg", "leg").cure == "did you mean 'leg'?");
}

TEST_CASE("a long list of known words is cut and counted") {
  const std::vector<std::string> known(60, "word");
  CHECK_THAT(wording::key_unknown("q", "a map", std::nullopt, known).cure, Catch::Contains("(60 in all)"));
}

TEST_CASE("a percentage written as a bare number is shown both ways it could be meant") {
  const Message message = wording::not_a_fraction("damping", "2", 2.0);
  CHECK(message.what == "'damping' is a fraction, and '2' is 200 %");
  CHECK(message.cure == "write '2 %' or 0.02 if that was meant");
  CHECK(wording::not_a_fraction("area_factor", "1.1", 1.1).cure == "give a value between 0 % and 100 %");
  CHECK(wording::not_a_fraction("damping", "500", 500.0).cure == "give a value between 0 % and 100 %");
}

TEST_CASE("only a force in place of a mass is told to be divided by gravity") {
  CHECK_THAT(wording::wrong_dimension("5 kN", "a mass", "kg", "a force").cure, Catch::Contains("9.80665"));
  CHECK(wording::wrong_dimension("5 m", "a mass", "kg", "a length").cure == "use kg");
  CHECK(wording::wrong_dimension("5 kN", "a length", "m", "a force").cure == "use m");
}

}  // namespace swaymark::test
