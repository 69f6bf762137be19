#pragma once

#include <optional>
#include <span>
#include <string_view>

#include "rainledger/reference/provenance.hpp"
#include "rainledger/reference/published_value.hpp"

// Typical steady infiltration rates, to judge a field test by.
namespace rainledger {

/// A row: a class of soil and the rates that a source calls typical of it. An end that the source
/// leaves open is empty ("more than 30 mm/h").
struct SteadyRateRow {
    std::string_view name;
    std::optional<double> low_mm_per_h = {};
    std::optional<double> high_mm_per_h = {};
    Provenance provenance;
};

/// FAO Irrigation water management, training manual 5, annex 2; Hillel (1980); Tideman (1996).
[[nodiscard]] std::span<const SteadyRateRow> steady_rate_rows();
[[nodiscard]] RowView view_of(const SteadyRateRow& row);

}  // namespace rainledger
