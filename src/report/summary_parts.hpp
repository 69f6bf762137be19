#pragma once

#include <cstddef>
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

/// The rain: depth, duration, peak, allowance, dry time, first instant.
[[nodiscard]] std::string rain_part(const Storm& storm, const Display& display);
/// Where the rain went: the accounts of every surface, place and the site.
[[nodiscard]] std::string accounts_part(const StormOnSite& on);
/// What the excess amounts to: depth, volume, runoff coefficient, worst-window flows.
[[nodiscard]] std::string excess_part(const StormOnSite& on);
/// When: ponding time, runoff start, ponded intervals.
[[nodiscard]] std::string instants_part(const StormOnSite& on);
/// Water still ponded at the end, phi indices matched, and whether the books balance.
[[nodiscard]] std::string closing_part(const StormOnSite& on);
/// The assumptions, a line for each surface.
[[nodiscard]] std::string assumptions_part(const Site& site, const Display& display);

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
