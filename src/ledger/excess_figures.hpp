#pragma once

#include <span>

#include "rainledger/ledger/ledger.hpp"

// What an area's excess amounts to: volume, coefficient, peak, worst windows.
namespace rainledger {

/// Figures of an area whose excess per step is in `rows` (the storm's own and appended steps). The
/// peak counts every step; windows slide over the step means and are dry outside the record.
[[nodiscard]] ExcessFigures excess_figures(std::span<const LedgerRow> rows, const Accounts& total,
                                           double area_m2, const Hyetograph& rain);

}  // namespace rainledger
