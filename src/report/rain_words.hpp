#pragma once

#include <array>
#include <string>
#include <string_view>

#include "rainledger/rain/design_storm.hpp"
#include "rainledger/rain/rainfall_statistics.hpp"

// Design storms, windows and rarity, in words.
namespace rainledger {

/// The windows in minutes in which a storm's heaviest rain is told.
inline constexpr std::array<int, 5> kPeakMinutes{5, 10, 15, 30, 60};

/// "alternating blocks", as people read it.
[[nodiscard]] std::string_view pattern_words(StormPattern pattern);
/// "alternating_blocks", as scenarios and JSON write it.
[[nodiscard]] std::string_view pattern_key(StormPattern pattern);

/// "10 yr", to four figures.
[[nodiscard]] std::string years_text(double years);

/// True for a depth that is less than a table's first.
[[nodiscard]] bool is_common(const Rarity& rarity);
/// A return period as far as a table gives it: "about 14 yr", "more than 100 yr", "less than 2 yr",
/// "between 1 yr and 2 yr"; "-" where it says nothing.
[[nodiscard]] std::string rarity_words(const Rarity& rarity);
/// The same for a narrow column, in years: "14", ">100", "<2", "1-2", "-".
[[nodiscard]] std::string rarity_cell(const Rarity& rarity);

/// The length in h of the storm's own step with the heaviest rain.
[[nodiscard]] double heaviest_step_h(const Hyetograph& rain);

}  // namespace rainledger
