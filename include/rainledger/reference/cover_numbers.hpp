#pragma once

#include <array>
#include <optional>
#include <span>
#include <string_view>

#include "rainledger/reference/answer.hpp"
#include "rainledger/reference/provenance.hpp"
#include "rainledger/reference/published_value.hpp"
#include "rainledger/reference/soil_group.hpp"

// Runoff curve numbers by cover (USDA, Urban Hydrology for Small Watersheds, TR-55, 1986, tables
// 2-2a to 2-2d), for antecedent condition II and an initial abstraction of 0.2 S.
namespace rainledger {

/// Hydrologic condition of a cover; `none` where the tables make no difference.
enum class HydrologicCondition { none, poor, fair, good };

/// "poor", "fair", "good"; empty for none.
[[nodiscard]] std::string_view condition_name(HydrologicCondition condition);
[[nodiscard]] std::optional<HydrologicCondition> find_condition(std::string_view typed);

/// A row of the tables.
struct CoverRow {
    std::string_view name;       ///< "row crops"
    std::string_view treatment;  ///< "contoured"; empty where there is none
    HydrologicCondition condition = HydrologicCondition::none;
    std::array<std::optional<int>, 4> numbers;   ///< groups A to D; empty where the table has none
    std::optional<int> impervious_percent = {};  ///< the average that the numbers hold already
    Provenance provenance;
    std::string_view note = {};  ///< where sources disagree, what a condition means
};

/// Tables 2-2a, 2-2b, 2-2c and 2-2d, and one older row that has no twin there, in the order
/// printed.
[[nodiscard]] std::span<const CoverRow> cover_rows();
[[nodiscard]] RowView view_of(const CoverRow& row);

/// A cover as a scenario names it; treatment and condition where the tables ask for them.
struct CoverAsked {
    std::string_view name;
    std::string_view treatment = {};
    std::optional<HydrologicCondition> condition = {};
};

/// The one row asked for; the problem says what is unknown or missing, and the hint what there is.
[[nodiscard]] Answer<const CoverRow*> find_cover(const CoverAsked& asked);

/// The number of a row for a group; some rangelands have none for group A.
[[nodiscard]] Answer<int> cover_number(const CoverRow& row, SoilGroup group);

}  // namespace rainledger
