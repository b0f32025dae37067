#include "core/tower_file_requests.hpp"

#include <algorithm>

#include <fmt/format.h>

#include "core/spectrum_csv.hpp"
#include "core/text.hpp"

namespace swaymark {

namespace {

constexpr int kMostModes = 100'000;
constexpr int kMostHarmonics = 1000;

BandDirection band_direction(MapView& band, const Tower& tower) {
  const YamlNode* node = band.find("direction");
  if (node == nullptr) return BandDirection::any;
  std::vector<std::string> choices = axis_names(tower);
  choices.insert(choices.end(), {"horizontal", "any"});
  const auto choice = read_choice(*node, "direction", choices, band.faults());
  if (!choice) return BandDirection::any;
  for (const BandDirection direction : {BandDirection::x, BandDirection::y, BandDirection::z,
                                        BandDirection::horizontal, BandDirection::any}) {
    if (name_of(direction) == choices[*choice]) return direction;
  }
  return BandDirection::any;
}

// A band by a running speed becomes one band for each harmonic.
void add_speed_bands(MapView& view, const BandStatement& base, Tower& tower) {
  const auto speed = view.required_value("speed", Quantity::frequency, Range::positive, "speed: 1450 rpm");
  const double spread = view.value("spread", Quantity::fraction, Range::below_one).value_or(0.0);
  std::vector<int> harmonics;
  if (const YamlNode* node = view.find("harmonics")) {
    if (const auto* items = read_list(*node, "harmonics", "whole numbers", view.faults())) {
      for (const YamlNode& item : *items) {
        const auto harmonic = read_whole_number(item, "harmonics", kMostHarmonics, view.faults());
        if (!harmonic) continue;
        if (std::find(harmonics.begin(), harmonics.end(), *harmonic) != harmonics.end()) {
          view.faults().add(item.place,
                            wording::name_twice("harmonic", std::to_string(*harmonic), node->place));
          continue;
        }
        harmonics.push_back(*harmonic);
      }
    }
  } else {
    harmonics = {1};
  }
  if (!speed) return;
  for (const int harmonic : harmonics) {
    BandStatement band = base;
    band.harmonic = harmonic;
    band.from = *speed * harmonic * (1.0 - spread);
    band.to = *speed * harmonic * (1.0 + spread);
    tower.bands.push_back(band);
  }
}

void read_band(const YamlNode& node, Tower& tower, NameTable& labels, FaultList& faults) {
  MapView view(node, "a band", faults);
  if (!view.is_map()) return;
  BandStatement band;
  band.place = node.place;
  if (const YamlNode* label = view.require("label", "label: rotor")) {
    band.label = read_word(*label, "label", faults).value_or("");
    if (const auto first = labels.place_of(band.label)) {
      faults.add(label->place, wording::name_twice("band", band.label, *first));
    }
    labels.add(band.label, 0, label->place);
  }
  band.margin = view.value("margin", Quantity::fraction, Range::below_one).value_or(0.0);
  band.direction = band_direction(view, tower);
  const bool by_speed = view.has("speed");
  const bool by_ends = view.has("from") || view.has("to");
  if (by_speed && by_ends) faults.add(node.place, wording::keys_exclude("speed", "from/to", view.owner()));
  if (by_speed) {
    add_speed_bands(view, band, tower);
    for (const char* end : {"from", "to"}) static_cast<void>(view.find(end));
  } else if (by_ends) {
    const auto from = view.required_value("from", Quantity::frequency, Range::not_negative, "from: 0.8 Hz");
    const auto to = view.required_value("to", Quantity::frequency, Range::positive, "to: 1.4 Hz");
    for (const char* key : {"spread", "harmonics"}) {
      if (view.find(key) != nullptr)
        faults.add(node.place, wording::keys_exclude(key, "from/to", view.owner()));
    }
    static_cast<void>(view.find("speed"));
    if (from && to && *from == *to) {
      faults.add(node.place, wording::band_without_width());
    } else if (from && to && *from > *to) {
      faults.add(node.place, wording::band_reversed(*from, *to));
    } else if (from && to) {
      band.from = *from;
      band.to = *to;
      tower.bands.push_back(band);
    }
  } else {
    for (const char* key : {"from", "to", "speed", "spread", "harmonics"}) static_cast<void>(view.find(key));
    faults.add(node.place, wording::one_key_of("'from' and 'to', or 'speed'", view.owner()));
  }
  view.refuse_unknown();
}

void read_points(const YamlNode& node, SpectrumStatement& spectrum, FaultList& faults) {
  const auto* items = read_list(node, "points", "[period, acceleration] pairs", faults);
  if (items == nullptr) return;
  const std::size_t faults_before = faults.size();
  for (const YamlNode& item : *items) {
    if (item.kind != YamlNode::Kind::sequence || item.items.size() != 2) {
      faults.add(item.place, wording::point_is_pair());
      continue;
    }
    const auto period = read_value(item.items[0], "period", Quantity::time, Range::not_negative, faults);
    const auto ordinate =
        read_value(item.items[1], "acceleration", Quantity::acceleration, Range::not_negative, faults);
    if (!period || !ordinate) continue;
    if (!spectrum.points.empty() && *period <= spectrum.points.back().first) {
      faults.add(item.place, wording::periods_must_rise(spectrum.points.back().first, *period));
      continue;
    }
    const bool logarithms = spectrum.interpolation == Interpolation::log_log;
    if (logarithms && (*period == 0.0 || *ordinate == 0.0))
      faults.add(item.place, wording::log_needs_positive());
    spectrum.points.emplace_back(*period, *ordinate);
  }
  if (spectrum.points.size() < 2 && faults.size() == faults_before) {
    faults.add(node.place, wording::points_need_two());
  }
}

void read_spectrum(const std::string& name, const YamlNode& key, const YamlNode& node,
                   const FileSource& source, Tower& tower, NameTable& names, FaultList& faults) {
  names.add(name, tower.spectra.size(), key.place);
  SpectrumStatement spectrum;
  spectrum.name = name;
  spectrum.place = key.place;
  MapView view(node, fmt::format("spectrum '{}'", excerpt(name)), faults);
  if (name == "none") faults.add(key.place, wording::name_reserved("spectrum", name));
  spectrum.damping = view.value("damping", Quantity::fraction, Range::below_one);
  if (const YamlNode* flag = view.find("damping_correction")) {
    spectrum.damping_correction = read_flag(*flag, "damping_correction", faults).value_or(false);
    if (spectrum.damping_correction && !view.has("damping")) {
      faults.add(flag->place, wording::correction_needs_damping());
    }
  }
  if (const YamlNode* kind = view.find("interpolation")) {
    const auto choice = read_choice(*kind, "interpolation", {"linear", "log-log"}, faults);
    if (choice && *choice == 1) spectrum.interpolation = Interpolation::log_log;
  }
  for (const char* later : {"rule", "type", "ground", "ag", "q"}) {
    view.refuse_later(later, "spectra by the formulas of a code are");
  }
  if (view.has("points") && view.has("points_from"))
    faults.add(key.place, wording::keys_exclude("points", "points_from", view.owner()));
  read_points_from(view, tower.file, source, spectrum);
  if (view.has("rule") || view.has("points_from")) {
    static_cast<void>(view.find("points"));
  } else if (const YamlNode* points = view.require("points", "points: [[0.0 s, 0.10 g], [0.2 s, 0.25 g]]")) {
    read_points(*points, spectrum, faults);
  }
  view.refuse_unknown();
  tower.spectra.push_back(std::move(spectrum));
}

void read_excited(MapView& view, Tower& tower, const NameTable& spectra, SeismicStatement& seismic) {
  const YamlNode* node = view.require("spectrum", "spectrum: {x: quay, y: quay, z: none}");
  if (node == nullptr) return;
  MapView axes(*node, "'spectrum' of seismic", view.faults());
  bool any = false;
  for (const Axis axis : tower.axes()) {
    const YamlNode* name = axes.find(name_of(axis));
    if (name == nullptr) continue;
    any = any || name->text != "none";
    if (name->kind == YamlNode::Kind::scalar && name->text == "none") continue;
    seismic.spectrum[static_cast<std::size_t>(axis)] = spectra.find(*name, view.faults());
  }
  axes.refuse_unknown();
  if (axes.is_map() && !any) view.faults().add(node->place, wording::no_direction_excited());
}

// A choice whose later words are known, so that they are told from slips of the pen.
std::optional<std::size_t> choice_or_later(MapView& view, std::string_view key,
                                           const std::vector<std::string>& choices,
                                           const std::vector<std::string>& later) {
  const YamlNode* node = view.find(key);
  if (node == nullptr) return std::nullopt;
  const bool is_later = node->kind == YamlNode::Kind::scalar &&
                        std::find(later.begin(), later.end(), node->text) != later.end();
  if (is_later) {
    view.faults().add(node->place, wording::not_yet_supported(fmt::format("'{}: {}' is", key, node->text)));
    return std::nullopt;
  }
  return read_choice(*node, key, choices, view.faults());
}

}  // namespace

void read_modes(MapView& file, Tower& tower) {
  const YamlNode* node = file.find("modes");
  if (node != nullptr) {
    MapView view(*node, "'modes'", file.faults());
    if (const YamlNode* count = view.find("count")) {
      tower.modes.count = read_whole_number(*count, "count", kMostModes, file.faults());
    }
    tower.modes.up_to = view.value("up_to", Quantity::frequency, Range::positive);
    tower.modes.mass_share = view.value("mass_share", Quantity::fraction, Range::share);
    view.refuse_later("between", "modes in a range are");
    view.refuse_unknown();
  }
  const bool stated = tower.modes.count || tower.modes.up_to || tower.modes.mass_share;
  if (!stated) tower.modes.mass_share = 0.9;
}

void read_bands(MapView& file, Tower& tower) {
  const YamlNode* node = file.find("bands");
  if (node == nullptr) return;
  const auto* items = read_list(*node, "bands", "bands", file.faults());
  if (items == nullptr) return;
  NameTable labels("band");
  for (const YamlNode& item : *items) read_band(item, tower, labels, file.faults());
}

void read_spectra(MapView& file, const FileSource& source, Tower& tower, NameTable& names) {
  const YamlNode* node = file.find("spectra");
  if (node == nullptr) return;
  for_each_named(*node, "spectra", file.faults(),
                 [&](const std::string& name, const YamlNode& key, const YamlNode& value) {
                   if (names.place_of(name)) return;  // written twice: reported with the keys
                   read_spectrum(name, key, value, source, tower, names, file.faults());
                 });
}

void read_seismic(MapView& file, Tower& tower, const NameTable& spectra, bool damped) {
  const YamlNode* node = file.find("seismic");
  if (node == nullptr) return;
  MapView view(*node, "'seismic'", file.faults());
  if (!view.is_map()) return;
  SeismicStatement seismic;
  seismic.place = node->place;
  read_excited(view, tower, spectra, seismic);
  constexpr std::array modal_rules{ModalRule::cqc, ModalRule::srss, ModalRule::absolute_sum};
  if (const auto rule =
          choice_or_later(view, "modes", {"CQC", "SRSS", "absolute sum"}, {"ten-percent", "double sum"})) {
    seismic.modes = modal_rules[*rule];
  }
  constexpr std::array directional_rules{DirectionalRule::srss, DirectionalRule::percent_30,
                                         DirectionalRule::percent_40};
  if (const auto rule = choice_or_later(view, "directions", {"SRSS", "100-30", "100-40"}, {"worst angle"})) {
    seismic.directions = directional_rules[*rule];
  }
  static_cast<void>(choice_or_later(view, "resistance", {"none"}, {"EN 1993-1-1"}));
  if (const YamlNode* flag = view.find("missing_mass")) {
    seismic.missing_mass = read_flag(*flag, "missing_mass", file.faults()).value_or(true);
  }
  seismic.factor = view.value("factor", Quantity::fraction, Range::positive).value_or(1.0);
  view.refuse_later("minor_ratio", "the worst angle of excitation is");
  view.refuse_later("azimuth", "turned axes of excitation are");
  view.refuse_unknown();
  if (!damped) file.faults().add(node->place, wording::seismic_needs_damping());
  tower.seismic = seismic;
}

}  // namespace swaymark
