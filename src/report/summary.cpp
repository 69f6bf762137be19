#include "rainledger/report/summary.hpp"

#include <cstddef>
#include <string>
#include <string_view>

#include "rainledger/report/caution.hpp"
#include "rainledger/report/version.hpp"
#include "report/display.hpp"
#include "report/summary_parts.hpp"

namespace rainledger {
namespace {

std::string storm_heading(const Scenario& scenario, std::size_t i) {
    constexpr std::string_view kUnnamed = "storm";  // given under `storm:`
    const std::string& name = scenario.storms[i].name;
    std::string out = "Storm";
    if (name != kUnnamed) out += " " + printable(name);
    if (scenario.storms.size() > 1)
        out += " (" + std::to_string(i + 1) + " of " + std::to_string(scenario.storms.size()) + ")";
    return out + "\n";
}

}  // namespace

std::string summary(const Scenario& scenario, std::span<const SiteLedger> ledgers,
                    const SummaryOptions& options) {
    const Display display(options.units);
    std::string out =
        scenario.title.empty() ? "Rainfall losses\n" : printable(scenario.title) + "\n";
    for (std::size_t i = 0; i < scenario.storms.size(); ++i) {
        const Storm& storm = scenario.storms[i];
        const StormOnSite on{scenario.site, storm, ledgers[i], display};
        out += "\n" + storm_heading(scenario, i) + rain_part(storm, display);
        out += "\n" + accounts_part(on);
        out += "\n" + excess_part(on);
        out += "\n" + instants_part(on);
        out += "\n" + closing_part(on);
    }
    out += "\n" + assumptions_part(scenario.site, display);
    out += "\n";
    out += kCaution;
    out += "\nBy rainledger " + std::string(version()) + ".\n";
    return out;
}

}  // namespace rainledger
