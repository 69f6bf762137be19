#include "rainledger/losses/green_ampt.hpp"
