#include "rainledger/fieldtest/fit_warning.hpp"

#include <array>
#include <cstddef>

namespace rainledger {

std::string_view fit_caution_key(FitCaution caution) {
    constexpr std::array<std::string_view, 15> kKeys{"not_identified",
                                                     "negative_steady_term",
                                                     "on_bound",
                                                     "final_above_last_rates",
                                                     "shorter_than_decay",
                                                     "correlated_residuals",
                                                     "no_freedom",
                                                     "few_readings",
                                                     "rising_rate",
                                                     "not_converged",
                                                     "stopped_early",
                                                     "final_depends_on_end",
                                                     "noisy",
                                                     "no_fit",
                                                     "pits_differ"};
    return kKeys[static_cast<std::size_t>(caution)];
}

}  // namespace rainledger
