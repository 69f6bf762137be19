#include <fmt/core.h>

#include "report/clock.hpp"
#include "report/summary_parts.hpp"

namespace rainledger {
namespace {

std::string start_line(const Hyetograph& rain) {
    std::string out = "  begins " + iso_stamp(*rain.stamps, 0);
    if (rain.clock_assumed)
        out += "; the stamps carry no zone, so the clock is assumed never to change";
    return out + "\n";
}

}  // namespace

std::string rain_part(const Storm& storm, const Display& display) {
    const Hyetograph& rain = storm.rain;
    std::string out =
        fmt::format("  {} {} of rain in {}, at most {} {}\n", display.depth(total_depth_mm(rain)),
                    display.depth_unit(), duration_text(own_duration_h(rain)),
                    display.rate(peak_intensity_mm_per_h(rain)), display.rate_unit());
    out +=
        fmt::format("  in {} step{} ({})\n", rain.own_steps, rain.own_steps == 1 ? "" : "s",
                    storm.file.empty() ? "steps in the scenario" : "file " + printable(storm.file));
    if (rain.taken_as_dry_h > 0.0)
        out += fmt::format("  {} of it without data, taken as dry\n",
                           duration_text(rain.taken_as_dry_h));
    if (rain.stamps) out += start_line(rain);
    if (storm.multiply_by != 1.0)
        out += fmt::format("  allowance: every depth multiplied by {}, already in these figures\n",
                           four_figures(storm.multiply_by));
    if (storm.continued_h > 0.0)
        out +=
            fmt::format("  then {} of dry time (continue_for)\n", duration_text(storm.continued_h));
    return out;
}

}  // namespace rainledger
