#include "rainledger/report/hyetograph_csv.hpp"

#include <cstddef>

#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

void append_edge(std::string& out, const Hyetograph& rain, std::size_t edge) {
    if (rain.stamps)
        out += iso_stamp(*rain.stamps, edge);
    else
        append_shortest(out, rain.given->value[edge] + 0.0);  // a negative zero loses its sign
}

std::string header(const Hyetograph& rain) {
    if (rain.stamps) return "start,end,depth [mm]\n";
    const std::string& unit = rain.given->unit;
    return "start [" + unit + "],end [" + unit + "],depth [mm]\n";
}

}  // namespace

std::string hyetograph_csv(const Hyetograph& rain) {
    std::string out = header(rain);
    for (std::size_t step = 0; step < rain.own_steps; ++step) {
        append_edge(out, rain, step);
        out += ',';
        append_edge(out, rain, step + 1);
        out += ',';
        append_shortest(out, rain.depth_mm[step] + 0.0);
        out += '\n';
    }
    return out;
}

}  // namespace rainledger
