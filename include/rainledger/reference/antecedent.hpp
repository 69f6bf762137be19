#pragma once

#include <span>
#include <string_view>

#include "rainledger/reference/provenance.hpp"

// Curve numbers for antecedent runoff conditions I and III.
namespace rainledger {

/// One row of the published table.
struct AntecedentRow {
    int condition_2;
    int condition_1;
    int condition_3;
};

/// USDA NRCS, National Engineering Handbook, Part 630, chapter 10, table 10-1, from CN 100 down.
/// Status: rows 100, 90, ..., 30 confirmed in Beven, Rainfall-Runoff Modelling: The Primer, table
/// B6.3.2 (after USDA-SCS 1985); the other rows from memory.
[[nodiscard]] std::span<const AntecedentRow> antecedent_table();

inline constexpr std::string_view kAntecedentSource =
    "NEH Part 630, chapter 10, table 10-1, linear between rows";

/// Where the row of a number comes from; between rows, from memory.
[[nodiscard]] const Provenance& antecedent_provenance(double condition_2);

/// The number for condition I or III of a condition II number, 0 < CN <= 100, linear between rows.
[[nodiscard]] double antecedent_dry(double condition_2);
[[nodiscard]] double antecedent_wet(double condition_2);

}  // namespace rainledger
