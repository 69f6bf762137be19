#include "ledger/run_on.hpp"

#include <algorithm>
#include <utility>

namespace rainledger {
namespace {

RateSeries scaled(const RateSeries& given, double factor) {
    RateSeries out = given;
    for (RatePiece& piece : out.pieces)
        piece.rate_mm_per_h *= factor;
    return out;
}

}  // namespace

void add_scaled(RateSeries& sum, const RateSeries& given, double factor) {
    if (sum.empty()) {
        sum = scaled(given, factor);
        return;
    }
    RateSeries out;
    for (std::size_t step = 0; step + 1 < sum.first.size(); ++step) {
        std::size_t a = sum.first[step];
        std::size_t b = given.first[step];
        const double step_end = sum.pieces[sum.first[step + 1] - 1].end_h;
        while (a < sum.first[step + 1] && b < given.first[step + 1]) {
            const RatePiece& one = sum.pieces[a];
            const RatePiece& other = given.pieces[b];
            const double end = std::min(one.end_h, other.end_h);
            out.add(end, one.rate_mm_per_h + factor * other.rate_mm_per_h);
            if (one.end_h <= end) ++a;
            if (other.end_h <= end) ++b;
        }
        out.end_step(step_end);
    }
    sum = std::move(out);
}

}  // namespace rainledger
