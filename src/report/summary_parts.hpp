#pragma once

#include <cstddef>
#include <span>
#include <string>
#include <vector>

#include "rainledger/ledger/ledger.hpp"
#include "rainledger/scenario/scenario.hpp"
#include "report/display.hpp"

// The parts of the summary, each a block of lines.
namespace rainledger {

inline constexpr std::size_t kPageWidth = 98;

/// What one part of the summary is about.
struct StormOnSite {
    const Site& site;
    const Storm& storm;
    const SiteLedger& ledger;
    const Display& display;
};

/// "Storm morning (2 of 3)", a line.
[[nodiscard]] std::string storm_heading(const Scenario& scenario, std::size_t i);
/// The rain: depth, duration, peak, where it comes from, allowance, dry time, first instant.
[[nodiscard]] std::string rain_part(const Storm& storm, const Display& display);
/// Where the rain went: the accounts of every surface, place and the site.
[[nodiscard]] std::string accounts_part(const StormOnSite& on);
/// What the excess amounts to: depth, volume, runoff coefficient, worst-window flows.
[[nodiscard]] std::string excess_part(const StormOnSite& on);
/// When: ponding time, runoff start, ponded intervals.
[[nodiscard]] std::string instants_part(const StormOnSite& on);
/// Excess and flows of every storm, place by place: for a scenario with several.
[[nodiscard]] std::string comparison_part(const Scenario& scenario,
                                          std::span<const SiteLedger> ledgers,
                                          const Display& display);
/// Water still ponded at the end, phi indices matched, and whether the books balance.
[[nodiscard]] std::string closing_part(const StormOnSite& on);
/// The assumptions, a line for each surface.
[[nodiscard]] std::string assumptions_part(const Site& site, const Display& display);

/// The last lines of what is told about rain alone: caution and program.
[[nodiscard]] std::string rain_closing();

/// The label of a place's row: "to CB-2".
[[nodiscard]] std::string place_label(const PlaceLedger& place);

/// A place drained to, or the whole site, with the label of its row.
struct JointPlace {
    std::string label;
    const PlaceLedger* ledger;
};
/// The places and then the site; one place alone is the site.
[[nodiscard]] std::vector<JointPlace> joint_places(const SiteLedger& ledger);

}  // namespace rainledger
