#pragma once

#include <cstddef>
#include <optional>
#include <string_view>
#include <vector>

#include "published/check_file.hpp"
#include "rainledger/base/quantity.hpp"
#include "rainledger/ledger/ledger.hpp"

namespace rainledger::published {

/// The ledger of a storm's only surface, from whichever side it was read: the library, or the files
/// that the program wrote.
struct StormBooks {
    std::vector<double> start_h;
    std::vector<double> end_h;
    std::vector<LedgerRow> rows;
    Accounts total;
    std::vector<PondedInterval> ponding;
    std::optional<double> runoff_start_h;
    std::optional<double> phi_index_mm_per_h;
    double excess_volume_m3 = 0.0;
};

/// One quantity of the books: a value per step, or one for the whole storm.
struct StormQuantity {
    std::string_view name;
    std::optional<Dimension> dimension;  ///< empty: a plain number
    bool per_step;
    double (*value)(const StormBooks& books, std::size_t step);
};

/// The quantity called `name`. Throws std::runtime_error if there is none.
[[nodiscard]] const StormQuantity& find_storm_quantity(std::string_view name);

/// The books that the library keeps. Throws std::runtime_error when the scenario is not one storm
/// over one surface, or is refused.
[[nodiscard]] StormBooks library_books(const StoredStorm& storm);

}  // namespace rainledger::published
