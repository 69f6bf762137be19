#pragma once

#include <string>

#include "rainledger/ledger/ledger.hpp"
#include "rainledger/scenario/scenario.hpp"

// The ledger as CSV, always in mm and h, numbers as the shortest text that parses back to the same
// double. Rows: each surface in the scenario's order, each place drained to (surface empty), the
// site (both empty), each with its steps in turn. A capacity that is unlimited or does not exist is
// an empty cell.
namespace rainledger {

/// True if any storm of the scenario carries timestamps: the CSV then has a last column `start`,
/// empty in the rows of a storm without them.
[[nodiscard]] bool has_start_column(const Scenario& scenario);

/// Line 1.
void append_ledger_header(std::string& out, bool with_start);

/// The rows of one storm at the storm's own steps.
void append_ledger_rows(std::string& out, const Site& site, const Storm& storm,
                        const SiteLedger& ledger, bool with_start);

/// The rows of one storm at reporting steps. A stamp between two edges of the storm has the UTC
/// offset of the edge before it.
void append_ledger_rows(std::string& out, const Site& site, const Storm& storm,
                        const ReportedLedger& reported, bool with_start);

}  // namespace rainledger
