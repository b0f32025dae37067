#include "apps/study.hpp"

#include "apps/shared_work.hpp"

namespace swaymark {

std::vector<const Analysis*> Study::states() const {
  std::vector<const Analysis*> list{stated.mechanisms.any() ? nullptr : &stated};
  for (const ScenarioResult& scenario : scenarios)
    list.push_back(scenario.computed() ? &*scenario.analysis : nullptr);
  return list;
}

std::vector<std::string> Study::labels() const {
  std::vector<std::string> list{kAsStated};
  for (const ScenarioResult& scenario : scenarios) list.push_back(scenario.label);
  return list;
}

Study study_of(TowerFile file, const Provenance& provenance, Scope scope) {
  if (file.scenarios.empty()) return {analyse(std::move(file.tower), provenance, scope), {}, 1};
  SharedWork shared;
  Study study{analyse(std::move(file.tower), provenance, scope, shared), {}, 1};
  for (Scenario& scenario : file.scenarios) {
    ScenarioResult result{scenario.label, scenario.keys, {}, {}};
    try {
      result.analysis = analyse(std::move(scenario.tower), provenance, scope, shared);
    } catch (const ComputationError& error) {
      result.failure = error.what();
    }
    study.scenarios.push_back(std::move(result));
  }
  study.different = shared.different();
  return study;
}

}  // namespace swaymark
