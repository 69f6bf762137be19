#include "rainledger/report/summary.hpp"

#include <cstddef>
#include <string>

#include "rainledger/report/caution.hpp"
#include "rainledger/report/version.hpp"
#include "report/display.hpp"
#include "report/summary_parts.hpp"

namespace rainledger {
std::string summary(const Scenario& scenario, std::span<const SiteLedger> ledgers,
                    const SummaryOptions& options) {
    const Display display(options.units);
    std::string out =
        scenario.title.empty() ? "Rainfall losses\n" : printable(scenario.title) + "\n";
    if (scenario.storms.size() > 1) out += "\n" + comparison_part(scenario, ledgers, display);
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
