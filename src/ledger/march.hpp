#pragma once

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <limits>
#include <type_traits>

#include "ledger/ponding.hpp"
#include "ledger/run_on.hpp"
#include "rainledger/ledger/ledger.hpp"
#include "rainledger/ledger/surface.hpp"
#include "rainledger/rain/hyetograph.hpp"

// Marching one surface through a storm. Written once for every infiltration law and every recorder;
// the curve number, a function of cumulative rain, has its own short routine.
//
// A recorder is told, with times from the start of the step in hand:
//   step_begins(step)
//   ponding_starts(h), ponding_ends(h), runoff_starts(h)
//   outflow(end_h, rate)           excess at a constant or mean rate since the piece before
//   coarse(difference_mm)          a part of varying excess was left longer than allowed
//   step_ends(step, accounts, capacity)   `capacity` is called only if the recorder wants it
namespace rainledger {

/// How a surface is marched beside its rain.
struct MarchInput {
    const RateSeries* run_on = nullptr;  ///< over the surface's own area; none without
    double allowed_mm = kNever;          ///< see parts.hpp; infinite if nobody receives the excess
};

/// Calls `visit(from, to, run_on_rate)` for each piece of a step, times from the step's start; one
/// piece of rate zero without run-on.
template <class Visit>
void for_each_piece(const RateSeries* run_on, std::size_t step, double duration_h,
                    const Visit& visit) {
    if (run_on == nullptr) {
        visit(0.0, duration_h, 0.0);
        return;
    }
    double from = 0.0;
    for (std::size_t i = run_on->first[step]; i < run_on->first[step + 1]; ++i) {
        const RatePiece& part = run_on->pieces[i];
        if (!(part.end_h > from)) continue;
        visit(from, part.end_h, part.rate_mm_per_h);
        from = part.end_h;
    }
}

/// A loss that takes all of its supply until it is full: interception, an initial loss.
class FillOnce {
public:
    explicit FillOnce(double limit_mm) : left_mm_(limit_mm) {}

    [[nodiscard]] bool is_full() const { return left_mm_ <= 0.0; }

    /// Time it takes at `rate` > 0, at most `most_h`; a fill within a rounding of that takes all.
    [[nodiscard]] double time_to_fill(double rate, double most_h) const {
        const double h = left_mm_ / rate;
        return h < most_h * (1.0 - kEndTolerance) ? h : most_h;
    }
    /// Takes in `rate` for `h`, which time_to_fill gave; returns the depth.
    double take(double rate, double h, bool fills) {
        const double depth = fills ? left_mm_ : rate * h;
        left_mm_ = fills ? 0.0 : left_mm_ - depth;
        return depth;
    }

private:
    double left_mm_;
};

/// Turns stretches into a step's accounts and passes events on.
template <class Recorder>
struct StepBook {
    Recorder& recorder;
    Accounts accounts;
    bool runs_off = false;  // has ever
    bool tells_ponding = true;

    void stretch(const Stretch& part) {
        accounts.infiltrated_mm += part.infiltrated_mm;
        if (part.excess_mm > 0.0) {
            accounts.excess_mm += part.excess_mm;
            if (!runs_off) recorder.runoff_starts(part.start_h);
            runs_off = true;
        }
        recorder.outflow(part.start_h + part.duration_h, part.excess_mm / part.duration_h);
    }
    void coarse(double difference_mm) { recorder.coarse(difference_mm); }
    void ponding_starts(double h) {
        if (tells_ponding) recorder.ponding_starts(h);
    }
    void ponding_ends(double h) {
        if (tells_ponding) recorder.ponding_ends(h);
    }
    void begin(std::size_t step, double rain_mm) {
        accounts = {rain_mm, 0.0, 0.0, 0.0, 0.0, 0.0};
        recorder.step_begins(step);
    }
};

/// The initial loss of a law that has one.
template <class Law>
double initial_loss_of(const Law& law) {
    if constexpr (requires { law.initial_loss_mm; }) {
        return law.initial_loss_mm;
    } else {
        return 0.0;
    }
}

/// The march of one surface under one infiltration law.
template <InfiltrationLaw Law, class Recorder>
class March {
public:
    March(const Law& law, const Surface& surface, const MarchInput& input, Recorder& recorder)
        : law_(law),
          run_on_(input.run_on),
          interception_(surface.interception_mm),
          initial_loss_(initial_loss_of(law)),
          state_{law.start(), 0.0, false},
          book_{recorder, {}, false, !std::is_same_v<Law, Impervious>},
          ponding_(
              law,
              {surface.depression_storage_mm, surface.ponded_water == PondedWater::infiltrates},
              input.allowed_mm, state_, book_),
          recorder_(recorder) {}

    March(const March&) = delete;  // ponding_ refers to state_ and book_
    March& operator=(const March&) = delete;

    void run(const Hyetograph& rain) {
        for (std::size_t step = 0; step < rain.steps(); ++step) {
            if (passes_quietly(rain, step)) continue;
            const double rate = rain.intensity_mm_per_h(step);
            book_.begin(step, rain.depth_mm[step]);
            for_each_piece(run_on_, step, rain.duration_h[step],
                           [&](double from, double to, double run_on_rate) {
                               book_.accounts.run_on_mm += run_on_rate * (to - from);
                               piece(from, to, rate, run_on_rate);
                           });
            book_.accounts.ponded_mm = state_.depth_mm;
            recorder_.step_ends(step, book_.accounts, [&] { return law_.capacity(state_.soil); });
        }
    }

private:
    /// A step through which one thing happens, as through most: rain infiltrating, or a full store
    /// running over. The same as the way through piece() and spell(), without their book-keeping.
    /// False, with nothing done, for any other step.
    bool passes_quietly(const Hyetograph& rain, std::size_t step) {
        if (run_on_ != nullptr || !initial_loss_.is_full()) return false;
        const double dt = rain.duration_h[step];
        const double depth = rain.depth_mm[step];
        double infiltrated = depth;
        if (state_.ponded) {
            if (!interception_.is_full() || !book_.runs_off) return false;
            if (!ponding_.runs_over(depth / dt)) return false;
            infiltrated = law_.advance_at_capacity(state_.soil, dt);
        } else if (depth > 0.0) {
            if (!interception_.is_full()) return false;
            const double w = depth / dt;
            if (law_.time_below(state_.soil, w, dt) < dt * (1.0 - kEndTolerance)) return false;
            law_.advance_below(state_.soil, w, dt);
        } else {
            law_.rest(state_.soil, dt);
        }
        const double excess = std::max(0.0, depth - infiltrated);
        recorder_.step_begins(step);
        recorder_.outflow(dt, excess / dt);
        recorder_.step_ends(step, Accounts{depth, 0.0, 0.0, infiltrated, state_.depth_mm, excess},
                            [&] { return law_.capacity(state_.soil); });
        return true;
    }

    /// Constant rain and run-on from `from` to `to`. Interception takes rain, not run-on; an
    /// initial loss then takes whatever comes, the soil resting meanwhile.
    void piece(double from, double to, double rain_rate, double run_on_rate) {
        if (!interception_.is_full() && rain_rate > 0.0) {
            const double h = interception_.time_to_fill(rain_rate, to - from);
            const bool fills = h < to - from;
            book_.accounts.initial_loss_mm += interception_.take(rain_rate, h, fills);
            after_interception(from, fills ? from + h : to, run_on_rate);
            if (!fills) return;
            from += h;
        }
        after_interception(from, to, rain_rate + run_on_rate);
    }

    void after_interception(double from, double to, double w) {
        if (!(to > from)) return;
        if (!initial_loss_.is_full() && w > 0.0) {
            const double h = initial_loss_.time_to_fill(w, to - from);
            const bool fills = h < to - from;
            book_.accounts.initial_loss_mm += initial_loss_.take(w, h, fills);
            recorder_.outflow(fills ? from + h : to, 0.0);
            if (!fills) return;
            from += h;
        }
        ponding_.spell(from, to, w);
    }

    const Law& law_;
    const RateSeries* run_on_;
    FillOnce interception_;
    FillOnce initial_loss_;
    PondState<Law> state_;
    StepBook<Recorder> book_;
    Ponding<Law, StepBook<Recorder>> ponding_;
    Recorder& recorder_;
};

/// The march of a curve-number surface: cumulative rain and run-on along the retention curve.
template <class Recorder>
class CurveNumberMarch {
public:
    CurveNumberMarch(const RetentionCurve& curve, const MarchInput& input, Recorder& recorder)
        : curve_(curve), input_(input), book_{recorder, {}, false, false}, recorder_(recorder) {}

    void run(const Hyetograph& rain) {
        for (std::size_t step = 0; step < rain.steps(); ++step) {
            const double rate = rain.intensity_mm_per_h(step);
            book_.begin(step, rain.depth_mm[step]);
            for_each_piece(input_.run_on, step, rain.duration_h[step],
                           [&](double from, double to, double run_on_rate) {
                               book_.accounts.run_on_mm += run_on_rate * (to - from);
                               piece(from, to - from, rate + run_on_rate);
                           });
            recorder_.step_ends(step, book_.accounts,
                                [] { return std::numeric_limits<double>::quiet_NaN(); });
        }
    }

private:
    void piece(double from, double h, double w) {
        const double dP = w * h;
        const double dry = curve_.initial_abstraction_mm - P_;
        // A sum that meets Ia but for the last bit has not passed it.
        if (dP <= dry * (1.0 + kEndTolerance) || dP == 0.0) {
            abstract(from, h, dP);
            return;
        }
        if (dry > 0.0) {
            abstract(from, dry / w, dry);
            from += dry / w;
            h -= dry / w;
        }
        if (input_.allowed_mm == kNever) {
            run_off(from, h, w);
            return;
        }
        const auto rate_after = [&](double part) {
            return w * runoff_slope(curve_, P_ + w * part);
        };
        const double coarsest = for_each_part(h, input_.allowed_mm, rate_after, [&](double part) {
            run_off(from, part, w);
            from += part;
        });
        if (coarsest > input_.allowed_mm) recorder_.coarse(coarsest);
    }

    void abstract(double from, double h, double depth) {
        book_.accounts.initial_loss_mm += depth;
        book_.stretch({from, h, 0.0, 0.0});
        P_ += depth;
    }

    void run_off(double from, double h, double w) {
        const RunoffIncrement part = runoff_increment(curve_, P_, w * h);
        book_.accounts.initial_loss_mm += part.initial_abstraction_mm;
        book_.stretch({from, h, part.infiltrated_mm, part.excess_mm});
        P_ += w * h;
    }

    RetentionCurve curve_;
    MarchInput input_;
    StepBook<Recorder> book_;
    Recorder& recorder_;
    double P_ = 0.0;
};

}  // namespace rainledger
