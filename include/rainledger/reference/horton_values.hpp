#pragma once

#include <span>
#include <string_view>

#include "rainledger/reference/provenance.hpp"
#include "rainledger/reference/published_value.hpp"

// Published parameters of Horton's capacity by soil and cover.
namespace rainledger {

/// A row. Sources differ in what they give: a part that a source does not hold is empty, and some
/// are a range alone.
struct HortonRow {
    std::string_view name;
    PublishedValue initial_capacity_mm_per_h = {};
    PublishedValue final_capacity_mm_per_h = {};
    PublishedValue decay_per_h = {};
    std::string_view rate_unit;   ///< as printed: "cm/h"
    std::string_view decay_unit;  ///< as printed, or as read: "1/h"
    Provenance provenance;
    std::string_view note = {};  ///< read it: the unit of the decay is in doubt in places

    /// True if all three parameters have a value, so that the row makes a law.
    [[nodiscard]] bool makes_a_law() const {
        return initial_capacity_mm_per_h.value && final_capacity_mm_per_h.value &&
               decay_per_h.value;
    }
};

/// Rawls, Yates and Asmussen (1976), ten soils; Akan (1993), initial capacities; Musgrave (1955),
/// final capacities by soil group; Akan (1992), a decay; lecture notes after Wilson (1990), five
/// covers; a drainage manual of 1984, four soil groups.
[[nodiscard]] std::span<const HortonRow> horton_rows();
[[nodiscard]] RowView view_of(const HortonRow& row);

}  // namespace rainledger
