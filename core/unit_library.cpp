#include "core/unit_library.hpp"

#include <cmath>
#include <memory>

#include <locale.h>  // NOLINT: newlocale and uselocale are POSIX, not in <clocale>
#include <udunits2.h>

namespace swaymark::unit_library {

namespace {

struct FreeUnit {
  void operator()(ut_unit* unit) const { ut_free(unit); }
};
struct FreeSystem {
  void operator()(ut_system* system) const { ut_free_system(system); }
};
struct FreeConverter {
  void operator()(cv_converter* converter) const { cv_free(converter); }
};
using Unit = std::unique_ptr<ut_unit, FreeUnit>;
using Converter = std::unique_ptr<cv_converter, FreeConverter>;

// The library reads numbers by the decimal sign of the locale, those of its own database included. This holds
// the calling thread, and no other, to the neutral one.
class NeutralLocale {
 public:
  NeutralLocale() : neutral_(newlocale(LC_ALL_MASK, "C", nullptr)), before_(uselocale(neutral_)) {}
  ~NeutralLocale() {
    uselocale(before_);
    freelocale(neutral_);
  }
  NeutralLocale(const NeutralLocale&) = delete;
  NeutralLocale& operator=(const NeutralLocale&) = delete;

 private:
  locale_t neutral_;
  locale_t before_;
};

ut_system* database() {
  static const std::unique_ptr<ut_system, FreeSystem> system = [] {
    ut_set_error_message_handler(ut_ignore);  // the library is silent; the outcome says what happened
    return std::unique_ptr<ut_system, FreeSystem>(ut_read_xml(nullptr));
  }();
  return system.get();
}

Unit parsed(std::string_view text) { return Unit(ut_parse(database(), std::string(text).c_str(), UT_UTF8)); }

}  // namespace

Factor factor_to(std::string_view unit, std::string_view si_unit) {
  const NeutralLocale guard;
  if (database() == nullptr) return {Outcome::no_database, 0.0};
  const Unit from = parsed(unit);
  const Unit to = parsed(si_unit);
  if (!from || !to) return {Outcome::unknown_unit, 0.0};
  if (ut_are_convertible(from.get(), to.get()) == 0) return {Outcome::other_dimension, 0.0};
  const Converter converter(ut_get_converter(from.get(), to.get()));
  if (!converter) return {Outcome::other_dimension, 0.0};
  const double one = cv_convert_double(converter.get(), 1.0);
  const double two = cv_convert_double(converter.get(), 2.0);
  const double none = cv_convert_double(converter.get(), 0.0);
  if (!std::isfinite(one) || one <= 0.0) return {Outcome::not_proportional, 0.0};
  if (two < one) return {Outcome::other_dimension, 0.0};  // reciprocal: 1/s against s
  if (none != 0.0 || std::abs(two - 2.0 * one) > 1e-12 * two) return {Outcome::not_proportional, 0.0};
  return {Outcome::converted, one};
}

}  // namespace swaymark::unit_library
