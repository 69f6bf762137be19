#pragma once

#include <span>
#include <string>

#include "report/fit_parts.hpp"

// The parts of a field test's summary, each a block of lines.
namespace rainledger {

/// The readings of a pit with their rates; of many, the first and the last.
[[nodiscard]] std::string readings_part(const TestFit& pit, const Display& display);
/// Whether the end of the test is steady, by which convention, and what that means.
[[nodiscard]] std::string steady_part(const TestFit& pit, const FieldFitOptions& options,
                                      const Display& display);
/// The laws in the order of their ranking, with parameters, intervals and errors.
[[nodiscard]] std::string laws_part(const RankedFits& fits, const FieldFitOptions& options,
                                    const Display& display);
/// How the laws were fitted, and how to read their table.
[[nodiscard]] std::string laws_notes(const RankedFits& fits, const FieldFitOptions& options);
/// Horton's straight line beside the nonlinear fit, or why there is none.
[[nodiscard]] std::string lines_part(const TestFit& pit, const Display& display);
/// What is wrong with the line; nothing where no pit has one.
[[nodiscard]] std::string lines_notes(std::span<const TestFit> pits);
/// How far the pits lie apart.
[[nodiscard]] std::string spread_part(const PooledFit& pooled, const Display& display);

}  // namespace rainledger
